//! What is said of a header that names no field: what keeps it from one, or which field it nearly names.

use super::header::Header;
use super::header_cell::{HeaderCell, Meaning};
use super::misspelt::nearly_named;
use super::one_line;
use super::overrides::option_for;
use super::reading::Reading;
use super::words::ColumnWords;
use crate::substance::{Field, Property};
use crate::workbook::column_letters;

/// What is said of a column that is not taken.
#[derive(Debug, Default)]
pub(super) struct Hint {
    /// To the user, with the way out.
    pub(super) remark: Option<String>,
    /// In the list of columns.
    pub(super) short: Option<String>,
}

/// What keeps a header from a field.
struct Doubt {
    why: String,
    short: &'static str,
    /// The fields that it may be, the likeliest first.
    fields: &'static [&'static str],
}

/// A header that nearly names a field, or names one but for a word.
pub(super) fn hint(sheet: &str, cell: &HeaderCell, words: &ColumnWords) -> Hint {
    if cell.meaning == Meaning::LeftAside {
        return Hint { remark: None, short: Some("left aside, as told by --column".to_owned()) };
    }
    let Some(header) = cell.header.as_ref() else {
        return Hint::default();
    };
    let place = format!("{sheet}: column {} (`{}`)", column_letters(cell.column), one_line(&cell.text));
    let told = |field: &str| option_for(sheet, cell.column, &cell.text, field);
    if let Meaning::NotInGroup(field) = cell.meaning {
        let id = field.id();
        return Hint {
            remark: Some(format!(
                "{place} is left aside, because the row above says that it is no {id}; if it is one: {}",
                told(id)
            )),
            short: Some("left aside because of the row above".to_owned()),
        };
    }
    if let Some(property) = beside_a_value(header, words) {
        let id = property.id();
        return Hint {
            remark: Some(format!(
                "{place} speaks of a limit, a class, a count, a difference or former values, so it is left aside; if it \
                 holds values of {id}: {}",
                told(id)
            )),
            short: Some(format!("left aside; names no value of {id}")),
        };
    }
    let nearly = nearly_named(header, words);
    if let Some(doubt) = doubt(header, words).filter(|_| nearly.is_none()) {
        let fields: Vec<String> = doubt.fields.iter().map(|field| told(field)).collect();
        return Hint {
            remark: Some(format!("{place} {}: {}", doubt.why, fields.join(" or "))),
            short: Some(doubt.short.to_owned()),
        };
    }
    let Some(id) = nearly.map(Field::id) else {
        return Hint::default();
    };
    Hint {
        remark: Some(format!("{place} is not recognised; if it is {id}: {}", told(id))),
        short: Some(format!("not recognised; nearest field: {id}")),
    }
}

/// The property whose limit, class, count or former value a header names.
fn beside_a_value(header: &Header, words: &ColumnWords) -> Option<Property> {
    let reading = Reading::new(header, words);
    let speaks = reading.is_beside_the_value && reading.main.is_disjoint(&words.never);
    speaks.then(|| header.property_beside(words))?
}

fn doubt(header: &Header, words: &ColumnWords) -> Option<Doubt> {
    let reading = Reading::new(header, words);
    let speaks_of =
        |concept: &str| words.concept(concept).is_some_and(|place| reading.everywhere.contains(&place));
    if reading.mostly_unknown || !reading.main.is_disjoint(&words.never) || reading.names_no_value() {
        return None;
    }
    let doubt = |why: &str, short, fields| Some(Doubt { why: why.to_owned(), short, fields });
    if speaks_of("pka") {
        let why = "does not say whether its pKa is of an acid or a base";
        return doubt(why, "acid or base not said", &["pka-acid", "pka-base"]);
    }
    if speaks_of("half-life") && speaks_of("body") {
        return None;
    }
    if speaks_of("half-life") {
        return Some(half_life_doubt(speaks_of));
    }
    if speaks_of("kow") {
        let why = "does not say whether it holds the logarithm; if it does";
        return doubt(why, "logarithm not said", &["log-kow"]);
    }
    if speaks_of("kd") {
        let why = "names sorption to the whole soil or sediment, which is no Koc, so it is left aside; if it is a Koc";
        return doubt(why, "Kd is no Koc", &["koc"]);
    }
    if speaks_of("loec") {
        let why = "names a LOEC, which lies above the NOEC, so it is left aside; if it holds NOEC or EC10";
        return doubt(why, "a LOEC is no NOEC", &["long-term-toxicity"]);
    }
    if speaks_of("chronic-value") && (speaks_of("acute-value") || speaks_of("acute")) {
        let why = "names acute and long-term values together, so it is left aside; if it holds one kind";
        return doubt(why, "acute or long-term not said", &["long-term-toxicity", "acute-toxicity"]);
    }
    if speaks_of("biodegradation") && (speaks_of("primary") || speaks_of("anaerobic")) {
        let why = "names primary or anaerobic degradation, which is no ready biodegradability, so it is left aside; if \
                   it is";
        return doubt(why, "no ready biodegradability", &["ready-biodegradability"]);
    }
    None
}

fn half_life_doubt(speaks_of: impl Fn(&str) -> bool) -> Doubt {
    let compartments = ["water", "sediment", "soil", "air", "fresh", "marine"];
    let named = compartments.iter().filter(|compartment| speaks_of(compartment)).count();
    let (why, short, fields): (_, _, &[&str]) = if speaks_of("water-and-sediment") {
        (
            "names water and sediment together, so it is left aside; if it is one of them",
            "water or sediment not said",
            &["half-life-water", "half-life-sediment"],
        )
    } else if named == 0 && speaks_of("lake-or-sea") {
        (
            "says `meer`, a lake in Dutch and the sea in German, so it is left aside; if it is one of them",
            "lake or sea not said",
            &["half-life-fresh-water", "half-life-marine-water"],
        )
    } else if named > 1 {
        (
            "names more than one compartment, so it is left aside; for soil, for example",
            "several compartments",
            &["half-life-soil"],
        )
    } else {
        (
            "names no compartment, so it is left aside; for soil, for example",
            "no compartment said",
            &["half-life-soil"],
        )
    };
    Doubt { why: why.to_owned(), short, fields }
}
