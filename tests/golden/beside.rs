//! The examples beside the inventory: a supplier's list in French, a stock list in Dutch, an export in German.

use crate::annotated::Annotated;
use crate::planted::check;

/// What is planted in all three.
const COMMON: [&str; 5] = ["fault", "read", "missing", "no-substance", "uncleared"];

#[test]
fn the_supplier_list_in_french_is_screened() {
    let annotated = Annotated::of("supplier-list.xls");
    assert_eq!((annotated.summary.screened, annotated.summary.sheets), (23, (1, 1)));
    check(&annotated, "supplier-list.xls", &COMMON);
    check(&annotated, "supplier-list.xls", &["blank", "copied"]);
    // Bisphenol A: H360F. TBBPA: a measured log Kow of 5.90, and the BCF of 1234 has no word that it was measured.
    assert_eq!(annotated.cell("Produits", 18, "REACH T"), "fulfilled");
    assert!(!annotated.cell("Produits", 11, "REACH B").starts_with("not fulfilled"));
}

#[test]
fn the_stock_list_in_dutch_is_screened() {
    let annotated = Annotated::of("site-stock.ods");
    assert_eq!((annotated.summary.screened, annotated.summary.sheets), (30, (1, 1)));
    check(&annotated, "site-stock.ods", &COMMON);
    check(&annotated, "site-stock.ods", &["blank", "copied"]);
    // Hexachlorobenzene: the BCF of 12000 lies above 5000 but is not said to be measured; H350 and H372 are stated.
    assert_eq!(annotated.cell("Voorraad", 36, "REACH vB"), "screens in");
    assert_eq!(annotated.cell("Voorraad", 36, "REACH T"), "fulfilled");
    // D4: 242 d in sediment by OECD 308 at 24 °C is measured and above every limit; H361f.
    assert_eq!(annotated.cell("Voorraad", 32, "REACH P"), "fulfilled");
    assert_eq!(annotated.cell("Voorraad", 32, "REACH T"), "fulfilled");
}

#[test]
fn the_export_in_german_is_screened() {
    let annotated = Annotated::of("erp-export.csv");
    // The row with semicolons that stand without quotes is none of them.
    assert_eq!((annotated.summary.screened, annotated.summary.sheets), (37, (1, 0)));
    check(&annotated, "erp-export.csv", &COMMON);
    check(&annotated, "erp-export.csv", &["not-read-as"]);
    // UV-328: log Kow above 6.5 by OECD 117. DDT: the BCF of 29500 is not said to be measured.
    assert_eq!(annotated.cell("erp-export", 25, "REACH B"), "screens in");
    assert_eq!(annotated.cell("erp-export", 21, "REACH vB"), "screens in");
    // Bis(tributyltin) oxide: H360FD and H372.
    assert_eq!(annotated.cell("erp-export", 39, "REACH T"), "fulfilled");
}
