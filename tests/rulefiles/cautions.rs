//! Which cautions the names, formulas and types of real substances raise.

use std::sync::Arc;

use kowledger::quantity::{Interval, Quantity, Unit};
use kowledger::rules::{Blocks, Caution, Subject, load_rule_set};
use kowledger::substance::{
    Basis, Cited, Conditions, Identity, Property, Reading, RowType, Substance, SubstanceType,
};
use kowledger::workbook::CellRef;

fn cell() -> CellRef {
    CellRef { sheet: Arc::from("Substances"), row: 1, column: 1 }
}

fn cited<T>(value: T) -> Cited<T> {
    Cited { value, cell: cell() }
}

fn substance() -> Substance {
    let mut substance = Substance::unknown(Arc::from("Substances"), 1);
    substance.identity = Identity::Identified;
    substance
}

fn named(name: &str) -> Substance {
    let mut substance = substance();
    substance.name = Some(cited(name.to_owned()));
    substance
}

fn cautions() -> Vec<Caution> {
    load_rule_set(&[]).unwrap().cautions
}

fn raised<'c>(cautions: &'c [Caution], substance: &Substance) -> Vec<&'c str> {
    let raised = cautions.iter().filter(|caution| caution.is_raised_by(substance).is_some());
    raised.map(|caution| caution.id.as_str()).collect()
}

/// Names as inventories write them, and every caution each must raise and no other.
const NAMES: &[(&str, &[&str])] = &[
    // Organic substances without any caution.
    ("Toluene", &[]),
    ("n-Hexane", &[]),
    ("Cyclohexanone", &[]),
    ("2-Butoxyethanol", &[]),
    ("2-Ethoxyethanol", &[]),
    ("Bis(2-ethylhexyl) phthalate", &[]),
    ("Di-n-butylphthalat", &[]),
    ("Dibutyl phthalate", &[]),
    ("Bisphenol A", &[]),
    ("Benzo[a]pyrene", &[]),
    ("Polychlorinated biphenyl 153", &[]),
    ("2,2',4,4',5,5'-Hexachlorobiphenyl", &[]),
    ("Polycyclic aromatic hydrocarbon sum", &[]),
    ("Hexabromocyclododecane", &[]),
    ("Decabromodiphenyl ether", &[]),
    ("Tris(2-chloroethyl) phosphate", &[]),
    ("Triphenyl phosphate", &[]),
    ("Octamethylcyclotetrasiloxane", &[]),
    ("Musk xylene", &[]),
    ("UV-328", &[]),
    ("Dimethyl sulfate", &[]),
    ("Dimethyl carbonate", &[]),
    ("Carbon tetrachloride", &[]),
    ("Methyl iodide", &[]),
    ("Vinyl chloride", &[]),
    ("Acetyl chloride", &[]),
    ("Ethyl nitrate", &[]),
    ("Tetraethyl silicate", &[]),
    ("Tributyl borate", &[]),
    ("Propylene oxide", &[]),
    ("Dicumyl peroxide", &[]),
    ("Allyl thiocyanate", &[]),
    ("Methyl isocyanate", &[]),
    ("Benzyl cyanide", &[]),
    ("Simvastatin", &[]),
    ("Biotin", &[]),
    ("Atrazine", &[]),
    ("Chlorpyrifos", &[]),
    ("1-Octanol", &[]),
    ("Melamine", &[]),
    ("Trifluoromethylbenzene", &[]),
    ("Naphthalene", &[]),
    ("Methoxychlor", &[]),
    ("Dimethyl polysulfide", &[]),
    ("Carbon disulfide", &[]),
    ("Phosgene", &[]),
    ("Urea", &[]),
    ("Methyl salicylate", &[]),
    ("Butyl acetate", &[]),
    ("Phthalic acid, bis(2-ethylhexyl) ester", &[]),
    // Inorganic substances, by their whole name.
    ("Sodium chloride", &["inorganic"]),
    ("Titanium dioxide", &["inorganic"]),
    ("Titandioxid", &["inorganic"]),
    ("Zinc oxide", &["inorganic"]),
    ("Zinkoxid", &["inorganic"]),
    ("Copper(II) sulfate pentahydrate", &["inorganic"]),
    ("Iron(III) chloride", &["inorganic"]),
    ("Natriumchlorid", &["inorganic"]),
    ("Calciumcarbonat", &["inorganic"]),
    ("Sodium hydrogen carbonate", &["inorganic"]),
    ("Potassium cyanide", &["inorganic"]),
    ("Sulfuric acid", &["inorganic", "ionisable"]),
    ("Schwefelsäure", &["inorganic", "ionisable"]),
    ("Sodium sulfate", &["inorganic"]),
    ("Ammonium nitrate", &["inorganic"]),
    ("Hydrogen peroxide", &["inorganic"]),
    ("Water", &["inorganic"]),
    ("Cobalt", &["inorganic"]),
    ("Mercury", &["inorganic"]),
    ("Lead", &["inorganic"]),
    ("Lead(II) oxide", &["inorganic"]),
    ("Eisen(III)-chlorid", &["inorganic"]),
    ("Hydrochloric acid 37 %", &["inorganic", "ionisable"]),
    // Metals bound to organic groups are never inorganic.
    ("Tributyltin chloride", &["organometallic"]),
    ("Tributylzinnoxid", &["organometallic"]),
    ("Bis(tributyltin) oxide", &["organometallic"]),
    ("Triphenyltin hydroxide", &["organometallic"]),
    ("Tetraethyl lead", &["organometallic"]),
    ("Stannane, tributyl-", &["organometallic"]),
    ("n-Butyllithium", &["organometallic"]),
    ("Triphenylarsine", &["organometallic"]),
    ("Tetraethylblei", &["organometallic"]),
    ("Dimethylmercury", &["organometallic"]),
    ("Methylmercury chloride", &["organometallic"]),
    ("Phenylmercuric acetate", &["organometallic"]),
    ("Ferrocene", &["organometallic"]),
    ("Nickel tetracarbonyl", &["organometallic"]),
    ("Diethylzinc", &["organometallic"]),
    ("Triethylaluminium", &["organometallic"]),
    ("Zinc pyrithione", &["organometallic"]),
    ("Dibutyltin dilaurate", &["organometallic"]),
    // Polymers.
    ("Polyethylene", &["polymer"]),
    ("Polystyrol", &["polymer"]),
    ("Poly(vinyl alcohol)", &["polymer"]),
    ("Polydimethylsiloxane", &["polymer"]),
    ("Styrene-butadiene copolymer", &["polymer"]),
    ("Epoxidharz", &["polymer"]),
    ("Nylon 6", &["polymer"]),
    ("Polyethylene glycol 400", &["polymer"]),
    // Variable composition.
    ("Alkanes, C10-13, chloro", &["uvcb"]),
    ("Distillates (petroleum), hydrotreated light", &["uvcb"]),
    ("White mineral oil", &["uvcb"]),
    ("Rizinusöl", &["uvcb"]),
    ("Phenol, 4-nonyl-, branched", &["uvcb"]),
    ("Rosin", &["uvcb"]),
    ("Chlorparaffin", &["uvcb"]),
    ("Reaction products of aniline and acetone", &["uvcb"]),
    ("Reaction mass of ethylbenzene and m-xylene", &["multi-constituent"]),
    ("Xylene, mixture of isomers", &["multi-constituent", "mixture"]),
    ("Xylol-Isomerengemisch", &["multi-constituent", "mixture"]),
    // Surfactants.
    ("Sodium dodecyl sulfate", &["surfactant", "permanent-charge"]),
    ("Sodium laureth sulfate", &["surfactant", "permanent-charge"]),
    ("Sodium dodecylbenzenesulfonate", &["surfactant", "permanent-charge"]),
    ("Nonylphenol ethoxylate", &["surfactant"]),
    ("Lauryl glucoside", &["surfactant"]),
    ("Lauryl methacrylate", &[]),
    ("N,N-Dimethyldodecylamine N-oxide", &["surfactant"]),
    ("Lauramine oxide", &["surfactant"]),
    ("Cocamidopropyl betaine", &["surfactant", "permanent-charge"]),
    ("Triton X-100", &["surfactant"]),
    ("Alcohols, C12-14, ethoxylated", &["uvcb", "surfactant"]),
    ("Benzalkonium chloride", &["surfactant", "permanent-charge"]),
    ("Didecyldimethylammonium chloride", &["surfactant", "permanent-charge"]),
    ("Hexadecyltrimethylammonium bromide", &["surfactant", "permanent-charge"]),
    ("Docusate sodium", &["surfactant", "permanent-charge"]),
    ("Natriumstearat", &["surfactant", "permanent-charge"]),
    // Perfluorinated chains.
    ("Perfluorooctanoic acid", &["perfluoroalkyl", "ionisable"]),
    ("Perfluoroctansulfonsäure", &["perfluoroalkyl", "permanent-charge", "ionisable"]),
    ("PFOA", &["perfluoroalkyl"]),
    ("PFHxS", &["perfluoroalkyl"]),
    ("Pentadecafluorooctanoic acid", &["perfluoroalkyl", "ionisable"]),
    ("Potassium heptadecafluorooctane-1-sulphonate", &["perfluoroalkyl", "permanent-charge"]),
    ("Heptafluorobutyric acid", &["perfluoroalkyl", "ionisable"]),
    ("1H,1H,2H,2H-Perfluorodecan-1-ol", &["perfluoroalkyl"]),
    ("8:2 FTOH", &["perfluoroalkyl"]),
    ("6:2 Fluorotelomer alcohol", &["perfluoroalkyl"]),
    ("Henicosafluorodecyl acrylate", &["perfluoroalkyl"]),
    ("Hexafluoropropylene oxide dimer acid", &["perfluoroalkyl", "ionisable"]),
    ("Perfluorooctanoic acid, ammonium salt", &["perfluoroalkyl", "permanent-charge"]),
    ("GenX", &["perfluoroalkyl"]),
    // Charged at every pH, and salts of organic ions.
    ("Paraquat dichloride", &["permanent-charge"]),
    ("Tetrabutylammonium bromide", &["permanent-charge"]),
    ("1-Butyl-3-methylimidazolium chloride", &["permanent-charge"]),
    ("Choline chloride", &["permanent-charge"]),
    ("p-Toluenesulfonic acid", &["permanent-charge", "ionisable"]),
    ("Methylene blue", &["permanent-charge"]),
    ("C.I. Acid Red 27", &["permanent-charge"]),
    ("Sodium benzoate", &["permanent-charge"]),
    ("Natriumbenzoat", &["permanent-charge"]),
    ("Sodium acetate", &["permanent-charge"]),
    ("Zinc stearate", &["permanent-charge"]),
    ("Glyphosate", &["permanent-charge"]),
    ("Diphenhydramine hydrochloride", &["permanent-charge"]),
    ("Diclofenac sodium", &["permanent-charge"]),
    ("Cobalt bis(2-ethylhexanoate)", &["permanent-charge"]),
    ("Titanium isopropoxide", &["permanent-charge"]),
    ("Neostigmine bromide", &["permanent-charge"]),
    // Acids.
    ("Benzoic acid", &["ionisable"]),
    ("2,4-Dichlorophenoxyacetic acid", &["ionisable"]),
    ("Benzoesäure", &["ionisable"]),
    ("Acetic acid ethyl ester", &[]),
    ("Acetic anhydride", &[]),
    // Other languages.
    ("Oxyde de tributylétain", &["organometallic"]),
    ("Chlorure de tributylétain", &["organometallic"]),
    ("Óxido de tributilestaño", &["organometallic"]),
    ("Ossido di tributilstagno", &["organometallic"]),
    ("Dimetilmercurio", &["organometallic"]),
    ("Paraffines chlorées", &["uvcb"]),
    ("Parafinas cloradas", &["uvcb"]),
    ("Paraffine clorurate", &["uvcb"]),
    ("Gechloreerde paraffinen", &["uvcb"]),
    ("Huile minérale", &["uvcb"]),
    ("Acide perfluorooctanoïque", &["perfluoroalkyl", "ionisable"]),
    ("Ácido perfluorooctanoico", &["perfluoroalkyl", "ionisable"]),
    ("Perfluoroctaanzuur", &["perfluoroalkyl", "ionisable"]),
    ("Nonylphénol éthoxylé", &["surfactant"]),
    ("Nonilfenol etoxilado", &["surfactant"]),
    ("Nonilfenolo etossilato", &["surfactant"]),
    ("Geëthoxyleerd nonylfenol", &["surfactant"]),
    ("Dioxyde de titane", &["inorganic"]),
    ("Dióxido de titanio", &["inorganic"]),
    ("Biossido di titanio", &["inorganic"]),
    ("Titaandioxide", &["inorganic"]),
    ("Oxyde de zinc", &["inorganic"]),
    ("Polietilenglicol", &["polymer"]),
    ("Polyéthylène glycol", &["polymer"]),
    ("Toluène", &[]),
    ("Tolueno", &[]),
    ("2-Éthoxyéthanol", &[]),
    ("Méthoxychlore", &[]),
    ("Carbonate de diméthyle", &[]),
    ("Sulfate de diméthyle", &[]),
    ("Cloruro de metilo", &[]),
    ("Chlorure de vinyle", &[]),
    // Names without Latin letters are looked at only as far as a few words go.
    ("塩化トリブチルスズ", &["organometallic", "nothing-to-look-at"]),
    ("三丁基氯化锡", &["organometallic", "nothing-to-look-at"]),
    ("塩素化パラフィン", &["uvcb", "nothing-to-look-at"]),
    ("氯化石蜡", &["uvcb", "nothing-to-look-at"]),
    ("ペルフルオロオクタン酸", &["perfluoroalkyl", "ionisable", "nothing-to-look-at"]),
    ("全氟辛酸", &["perfluoroalkyl", "ionisable", "nothing-to-look-at"]),
    ("全氟辛烷磺酸", &["perfluoroalkyl", "permanent-charge", "ionisable", "nothing-to-look-at"]),
    ("ノニルフェノールエトキシレート", &["surfactant", "nothing-to-look-at"]),
    ("壬基酚乙氧基化物", &["surfactant", "nothing-to-look-at"]),
    ("二酸化チタン", &["inorganic", "nothing-to-look-at"]),
    ("二氧化钛", &["inorganic", "nothing-to-look-at"]),
    ("聚乙二醇", &["polymer", "nothing-to-look-at"]),
    ("塩化ビニル", &["nothing-to-look-at"]),
    ("トルエン", &["nothing-to-look-at"]),
    ("甲苯", &["nothing-to-look-at"]),
];

#[test]
fn names_raise_the_cautions_they_should_and_no_others() {
    let cautions = cautions();
    let wrong: Vec<String> = NAMES
        .iter()
        .filter_map(|(name, expected)| {
            let found = raised(&cautions, &named(name));
            (found != *expected).then(|| format!("{name}: raised {found:?}, should raise {expected:?}"))
        })
        .collect();
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
    assert!(NAMES.len() >= 80);
}

#[test]
fn a_stated_type_raises_its_caution_whatever_the_name() {
    let cautions = cautions();
    for (kind, expected) in [
        (SubstanceType::Organic, vec![]),
        (SubstanceType::Inorganic, vec!["inorganic"]),
        (SubstanceType::Organometallic, vec!["organometallic"]),
        (SubstanceType::Polymer, vec!["polymer"]),
        (SubstanceType::Uvcb, vec!["uvcb"]),
        (SubstanceType::MultiConstituent, vec!["multi-constituent"]),
        (SubstanceType::Mixture, vec!["mixture"]),
        (SubstanceType::Surfactant, vec!["surfactant"]),
        (SubstanceType::OrganicSalt, vec!["permanent-charge", "ionisable"]),
        (SubstanceType::Perfluoroalkyl, vec!["perfluoroalkyl"]),
        (SubstanceType::Ionisable, vec!["ionisable"]),
    ] {
        let mut substance = named("Product 4711");
        substance.substance_type = Some(cited(kind));
        assert_eq!(raised(&cautions, &substance), expected, "{kind:?}");
    }
}

#[test]
fn further_types_of_a_cell_raise_their_cautions_beside_the_first() {
    let mut substance = named("Product 4711");
    substance.substance_type = Some(cited(SubstanceType::Surfactant));
    substance.further_types = [SubstanceType::Perfluoroalkyl].into();
    assert_eq!(raised(&cautions(), &substance), ["surfactant", "perfluoroalkyl"]);
}

#[test]
fn identity_and_row_type_raise_their_cautions() {
    let cautions = cautions();
    for (identity, expected) in [
        (Identity::Identified, vec![]),
        (Identity::NameAlone, vec!["identity-by-name-alone"]),
        (Identity::RepairedDate, vec!["identity-by-repaired-date"]),
        (Identity::BareNumber, vec!["identity-by-bare-number"]),
        (Identity::NotIdentified, vec!["not-identified"]),
    ] {
        let mut substance = named("Toluene");
        substance.identity = identity;
        assert_eq!(raised(&cautions, &substance), expected, "{identity:?}");
    }
    let mut mixture = named("Cleaner 12");
    mixture.row_type = RowType::Mixture;
    assert_eq!(raised(&cautions, &mixture), ["mixture"]);
}

#[test]
fn a_formula_without_carbon_is_inorganic_and_the_salt_of_an_organic_acid_is_not() {
    let cautions = cautions();
    for (formula, expected) in [("NaCl", vec!["inorganic"]), ("C2H3NaO2", vec![]), ("C12H27ClSn", vec![])] {
        let mut substance = named("Product 4711");
        substance.formula = Some(cited(formula.to_owned()));
        assert_eq!(raised(&cautions, &substance), expected, "{formula}");
    }
}

fn with_pka(property: Property, pka: f64) -> Substance {
    let mut substance = named("Product 4711");
    let quantity = Quantity {
        interval: Interval::point(pka).unwrap(),
        unit: Unit::One,
        written_sd: None,
        approximate: false,
        reported: pka.to_string(),
    };
    let reading =
        Reading { quantity, basis: Basis::Measured, conditions: Conditions::default(), cell: cell() };
    substance.readings.insert(property, vec![reading]);
    substance
}

#[test]
fn a_pka_that_leaves_a_tenth_ionised_between_ph_4_and_9_is_ionisable() {
    let cautions = cautions();
    for (property, pka, is_ionisable) in [
        (Property::PkaAcid, 4.76, true),
        (Property::PkaAcid, 0.5, true),
        (Property::PkaAcid, 9.9, true),
        (Property::PkaAcid, 10.0, false),
        (Property::PkaBase, 10.6, true),
        (Property::PkaBase, 3.1, true),
        (Property::PkaBase, 3.0, false),
    ] {
        let found = raised(&cautions, &with_pka(property, pka));
        assert_eq!(found == ["ionisable"], is_ionisable, "{property:?} {pka}: {found:?}");
    }
}

#[test]
fn cautions_stop_what_the_published_practice_says() {
    use Property::{Baf, Bcf, Koc, LogD, LogKow};
    let subjects =
        |properties: &[Property]| Some(properties.iter().copied().map(Subject::Property).collect());
    let everything = None;
    let expected: Vec<(&str, Option<std::collections::BTreeSet<Subject>>)> = vec![
        ("organometallic", subjects(&[LogKow])),
        ("polymer", everything.clone()),
        ("uvcb", everything.clone()),
        ("multi-constituent", everything.clone()),
        ("mixture", everything.clone()),
        ("surfactant", subjects(&[LogKow])),
        ("perfluoroalkyl", subjects(&[LogKow, Bcf, Baf])),
        ("permanent-charge", subjects(&[LogKow])),
        ("ionisable", subjects(&[Koc, LogD])),
        ("identity-by-name-alone", everything.clone()),
        ("identity-by-repaired-date", everything.clone()),
        ("not-identified", everything.clone()),
        ("nothing-to-look-at", everything),
    ];
    let cautions = cautions();
    for (id, stopped) in expected {
        let caution = cautions.iter().find(|caution| caution.id == id).unwrap();
        let found = match &caution.blocks {
            Blocks::Everything => None,
            Blocks::Subjects(subjects) => Some(subjects.clone()),
        };
        assert_eq!(found, stopped, "{id}");
        let at_most_screening = ["organometallic", "surfactant", "permanent-charge"].contains(&id);
        let log_kow = Subject::Property(LogKow);
        assert_eq!(caution.at_most_screening.contains(&log_kow), at_most_screening, "{id}");
    }
}

#[test]
fn a_row_that_names_its_substance_by_number_alone_says_that_nothing_was_looked_at() {
    let cautions = cautions();
    assert_eq!(raised(&cautions, &substance()), ["nothing-to-look-at"]);
    for (name, expected) in [
        ("4711", vec!["nothing-to-look-at"]),
        ("A-12", vec!["nothing-to-look-at"]),
        ("толуол", vec!["nothing-to-look-at"]),
        ("トルエン A", vec!["nothing-to-look-at"]),
        ("DDT", vec![]),
        ("α-Pinene", vec![]),
        ("Toluol（トルエン）", vec![]),
    ] {
        assert_eq!(raised(&cautions, &named(name)), expected, "{name}");
    }
}

#[test]
fn a_telling_type_or_an_inorganic_formula_is_something_to_look_at_and_others_are_not() {
    let cautions = cautions();
    for (kind, expected) in [
        (SubstanceType::Organic, vec!["nothing-to-look-at"]),
        (SubstanceType::Surfactant, vec!["surfactant"]),
    ] {
        let mut substance = substance();
        substance.substance_type = Some(cited(kind));
        assert_eq!(raised(&cautions, &substance), expected, "{kind:?}");
    }
    for (formula, expected) in [("NaCl", vec!["inorganic"]), ("C8HF15O2", vec!["nothing-to-look-at"])] {
        let mut substance = substance();
        substance.formula = Some(cited(formula.to_owned()));
        assert_eq!(raised(&cautions, &substance), expected, "{formula}");
    }
}
