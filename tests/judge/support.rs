//! Rows made for a test, and the verdict that the built-in rulebooks give them.

use std::sync::{Arc, LazyLock};

use kowledger::evidence::gather_evidence;
use kowledger::judge::{Closeness, CriterionJudgement, Judgement, Stop, Verdict, judge};
use kowledger::quantity::{Bound, Interval, Quantity};
use kowledger::reasoning::{Told, criterion_line};
use kowledger::rules::{RuleSet, load_rule_set};
use kowledger::substance::{
    Basis, CasNumber, Cited, Conditions, DegradationKind, DegradationTest, HazardStatements, Identity,
    Property, Reading, ReadyBiodegradability, Substance, SubstanceType,
};
use kowledger::workbook::CellRef;

/// The rulebooks that are built in, loaded once.
pub static RULES: LazyLock<RuleSet> = LazyLock::new(|| {
    let all = ["eu-reach-pbt", "eu-clp-pbt-pmt", "un-stockholm-annex-d", "ca-persistence-bioaccumulation"];
    load_rule_set(&all.map(String::from)).expect("the built-in rulebooks load")
});

/// A value as a cell could give it.
#[derive(Debug, Clone, Copy)]
pub enum Value {
    /// `4.5`
    Point(f64),
    /// `< 4.5`
    Less(f64),
    /// `> 4.5`
    Greater(f64),
    /// `4.2-4.8`
    Range(f64, f64),
}

impl Value {
    fn interval(self) -> Interval {
        match self {
            Self::Point(value) => Interval::point(value),
            Self::Less(value) => Interval::new(Bound::Unbounded, Bound::Excluded(value)),
            Self::Greater(value) => Interval::new(Bound::Excluded(value), Bound::Unbounded),
            Self::Range(low, high) => Interval::new(Bound::Included(low), Bound::Included(high)),
        }
        .expect("test values are in order")
    }
}

/// A row under construction: identified by a CAS number, ultimate half-lives at 12 °C.
pub struct Row(pub Substance);

/// A row with a right CAS number and a name that raises no caution.
pub fn row() -> Row {
    let mut substance = Substance::unknown(Arc::from("Substances"), 6);
    substance.cas = Some(cited(CasNumber::parse("100-00-5").expect("a right number"), 1));
    substance.name = Some(cited("1-chloro-4-nitrobenzene".to_owned(), 0));
    substance.identity = Identity::Identified;
    Row(substance)
}

fn cited<T>(value: T, column: u16) -> Cited<T> {
    Cited { value, cell: CellRef { sheet: Arc::from("Substances"), row: 6, column } }
}

impl Row {
    /// A measured value, ultimate degradation at 12 °C.
    pub fn measured(self, property: Property, value: Value) -> Self {
        self.with(property, value, Basis::Measured)
    }

    /// A value of a basis, ultimate degradation at 12 °C.
    pub fn with(self, property: Property, value: Value, basis: Basis) -> Self {
        let conditions = Conditions {
            temperature: Some(12.0),
            degradation: DegradationKind::Ultimate,
            ..Conditions::default()
        };
        self.under(property, value, basis, conditions)
    }

    /// A value under stated conditions.
    pub fn under(mut self, property: Property, value: Value, basis: Basis, conditions: Conditions) -> Self {
        let readings = self.0.readings.entry(property).or_default();
        let column = u16::try_from(10 + readings.len()).expect("few readings");
        readings.push(Reading {
            quantity: Quantity {
                interval: value.interval(),
                unit: property.default_unit(),
                written_sd: None,
                approximate: false,
                reported: format!("{value:?}"),
            },
            basis,
            conditions,
            cell: CellRef { sheet: Arc::from("Substances"), row: 6, column },
        });
        self
    }

    /// A word on ready biodegradability.
    pub fn ready(mut self, result: DegradationTest) -> Self {
        let entry = ReadyBiodegradability {
            result,
            basis: Basis::Unstated,
            reliability: None,
            reported: format!("{result:?}"),
        };
        self.0.ready.push(cited(entry, 20));
        self
    }

    /// A filled hazard statement cell.
    pub fn statements(mut self, codes: &[&str]) -> Self {
        let statements = HazardStatements::new(codes.iter().map(|code| (*code).to_owned()));
        self.0.hazard_statements = Some(cited(statements, 21));
        self
    }

    /// Another name.
    pub fn named(mut self, name: &str) -> Self {
        self.0.name = Some(cited(name.to_owned(), 0));
        self
    }

    /// A stated substance type.
    pub fn of_type(mut self, kind: SubstanceType) -> Self {
        self.0.substance_type = Some(cited(kind, 2));
        self
    }

    /// Identified by its name alone.
    pub fn by_name_alone(mut self) -> Self {
        self.0.cas = None;
        self.0.identity = Identity::NameAlone;
        self
    }

    /// Another way of being identified.
    pub fn identified_as(mut self, identity: Identity) -> Self {
        self.0.identity = identity;
        self
    }

    /// Judged by the built-in rulebooks.
    pub fn judged(&self) -> Judged {
        let evidence = gather_evidence(&self.0, &RULES.relations);
        let judgement = judge(&self.0, &evidence, &RULES);
        Judged { substance: self.0.clone(), judgement }
    }
}

/// A judged row.
pub struct Judged {
    substance: Substance,
    /// The judgement.
    pub judgement: Judgement,
}

impl Judged {
    fn book(short: &str) -> usize {
        RULES.rulebooks.iter().position(|rulebook| rulebook.short == short).expect("a built-in rulebook")
    }

    /// A criterion of a rulebook.
    pub fn criterion(&self, short: &str, id: &str) -> &CriterionJudgement {
        let book = Self::book(short);
        let place = RULES.rulebooks[book]
            .criteria
            .iter()
            .position(|criterion| criterion.id == id)
            .expect("a criterion");
        &self.judgement.rulebooks[book].criteria[place]
    }

    /// The verdict on a criterion or designation, as its cell words it.
    pub fn cell(&self, short: &str, id: &str) -> String {
        let book = Self::book(short);
        let rulebook = &RULES.rulebooks[book];
        if let Some(place) = rulebook.criteria.iter().position(|criterion| criterion.id == id) {
            let judged = &self.judgement.rulebooks[book].criteria[place];
            return kowledger::reasoning::verdict_text(&rulebook.criteria[place], judged);
        }
        let place =
            rulebook.designations.iter().position(|designation| designation.id == id).expect("a designation");
        let judged = &self.judgement.rulebooks[book].designations[place];
        kowledger::reasoning::with_closeness(judged.verdict, judged.closeness)
    }

    /// The verdict on a criterion.
    pub fn verdict(&self, short: &str, id: &str) -> Verdict {
        self.criterion(short, id).verdict
    }

    /// Whether a criterion is a close call.
    pub fn is_close(&self, short: &str, id: &str) -> bool {
        self.criterion(short, id).closeness == Closeness::CloseCall
    }

    /// Everything that stopped a clear of a criterion.
    pub fn stops(&self, short: &str, id: &str) -> Vec<Stop> {
        self.criterion(short, id).stopped.iter().flat_map(|clear| clear.stops.clone()).collect()
    }

    /// The ids of the cautions that the row raises.
    pub fn cautions(&self) -> Vec<&'static str> {
        self.judgement.cautions.iter().map(|raised| RULES.cautions[raised.caution].id.as_str()).collect()
    }

    /// The sentence of a criterion.
    pub fn sentence(&self, short: &str, id: &str) -> String {
        let evidence = gather_evidence(&self.substance, &RULES.relations);
        let told = Told {
            substance: &self.substance,
            evidence: &evidence,
            rules: &RULES,
            judgement: &self.judgement,
        };
        let book = told.books().nth(Self::book(short)).expect("a built-in rulebook");
        let (criterion, judged) =
            book.criteria().find(|(criterion, _)| criterion.id == id).expect("a criterion");
        criterion_line(book, criterion, judged).sentence
    }
}
