//! Cells on ready biodegradability.
//!
//! At least 70 % is ready; 60 to 70 % only with a named O2 or CO2 measure; below 60 % is not (OECD 301, pass levels).
//! A pass reached after more than 28 days is open, and so is a level missed before 28 days are over.

mod denials;
mod numbers;
mod window;
mod words;

use super::cell::value_text;
use super::remark::Said;
use crate::columns::Readiness;
use crate::fault::CellFaultKind;
use crate::quantity::{Comparison, DecimalStyle, Interval, Outcome};
use crate::substance::{Basis, DegradationTest, ReadyBiodegradability};
use crate::workbook::CellContent;
use numbers::{Measure, measure_in};
pub(super) use numbers::{bare_number, days_in, percentages};
pub(crate) use words::names_ready_test;
use words::{OtherTest, Words, is_doubtful, other_test, says_ready, words_of};
pub(super) use words::{says_inherent, says_ready_or_not};

/// Pass level for dissolved organic carbon and for an unnamed measure, %.
const PASS_ANY_MEASURE: f64 = 70.0;
/// Pass level for oxygen uptake and carbon dioxide, %.
const PASS_O2_OR_CO2: f64 = 60.0;
/// Length of the test, days.
const TEST_DAYS: f64 = 28.0;

/// A cell on ready biodegradability whose basis is still open.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct ReadyCell {
    result: DegradationTest,
    reported: String,
}

impl ReadyCell {
    /// Below a header that does not say `ready`, a pass counts only where the cell says that it is one of a ready test.
    pub(super) fn below(mut self, readiness: Readiness) -> Self {
        let is_open = readiness == Readiness::NotSaid
            && self.result == DegradationTest::Ready
            && !says_ready(&self.reported)
            && !names_ready_test(&self.reported);
        if is_open {
            self.result = DegradationTest::Open;
        }
        self
    }

    pub(super) fn known_by(self, basis: Basis, reliability: Option<u8>) -> ReadyBiodegradability {
        ReadyBiodegradability { result: self.result, basis, reliability, reported: self.reported }
    }
}

pub(super) type Read<T> = Result<Option<T>, CellFaultKind>;

const NOT_READY_CELL: CellFaultKind =
    CellFaultKind::NotA { what: "result of a ready biodegradability test", example: "82 %, 28 d, OECD 301B" };

/// What a cell says of ready biodegradability, with a fault where its words and numbers disagree.
pub(super) fn read_ready(
    content: &CellContent,
    decimal: DecimalStyle,
) -> Read<(ReadyCell, Said, Option<CellFaultKind>)> {
    let plain_cell =
        |result, reported: String| Ok(Some((ReadyCell { result, reported }, Said::default(), None)));
    match content {
        CellContent::Boolean(true) => return plain_cell(DegradationTest::Ready, "TRUE".to_owned()),
        CellContent::Boolean(false) => return plain_cell(DegradationTest::NotReady, "FALSE".to_owned()),
        CellContent::Number(number) => {
            let degraded = percentage_of_number(*number)?;
            return plain_cell(result_of(degraded, None, Measure::Unnamed), number.to_string());
        }
        CellContent::DateTime(_) => return Err(NOT_READY_CELL),
        CellContent::Empty | CellContent::Text(_) | CellContent::Error(_) => {}
    }
    let Some(text) = value_text(content) else {
        return Ok(None);
    };
    if let Some(number) = bare_number(&text, decimal) {
        let degraded = percentage_of_number(number)?;
        return plain_cell(result_of(degraded, None, Measure::Unnamed), text);
    }
    let (result, fault) = result_of_text(&text, decimal)?;
    let said = Said::in_remarks(std::slice::from_ref(&text));
    Ok(Some((ReadyCell { result, reported: text }, said, fault)))
}

fn result_of_text(
    text: &str,
    decimal: DecimalStyle,
) -> Result<(DegradationTest, Option<CellFaultKind>), CellFaultKind> {
    let words = words_of(text);
    let numbers = result_in_numbers(text, decimal).map(|numbers| match numbers {
        // Words for not ready stand against a pass; other denials and doubts leave it open.
        DegradationTest::Ready if words != Words::No && is_doubtful(text) => DegradationTest::Open,
        DegradationTest::Ready | DegradationTest::NotReady | DegradationTest::Open => numbers,
    });
    if words == Words::NoResult && numbers.is_none() {
        return Err(NOT_READY_CELL);
    }
    match other_test(text) {
        // What fails a test of inherent biodegradability fails the one of ready biodegradability as well.
        Some(OtherTest::Inherent(_)) if numbers == Some(DegradationTest::NotReady) => {}
        Some(OtherTest::Inherent(named) | OtherTest::Further(named)) if words != Words::No => {
            return Err(CellFaultKind::OtherDegradationTest { test: named });
        }
        Some(_) | None => {}
    }
    if says_inherent(text) && words != Words::No {
        return Err(CellFaultKind::InherentlySettlesNothing);
    }
    combined(words, numbers, days_in(text))
}

/// Words that say it and numbers that say otherwise leave it open.
fn combined(
    words: Words,
    numbers: Option<DegradationTest>,
    days: Option<f64>,
) -> Result<(DegradationTest, Option<CellFaultKind>), CellFaultKind> {
    let late = days.is_some_and(|days| days > TEST_DAYS);
    let in_words = match words {
        Words::Both => return Ok((DegradationTest::Open, Some(CellFaultKind::SaysBoth))),
        Words::Yes => Some(DegradationTest::Ready),
        Words::No => Some(DegradationTest::NotReady),
        Words::Doubtful => Some(DegradationTest::Open),
        Words::NoResult | Words::Silent => None,
    };
    match (in_words, numbers) {
        (None, None) => Err(NOT_READY_CELL),
        (Some(DegradationTest::Ready), None | Some(DegradationTest::Open)) if late => {
            Ok((DegradationTest::Open, None))
        }
        (Some(words), None | Some(DegradationTest::Open)) => Ok((words, None)),
        // A doubt in words is not lifted by a number.
        (Some(DegradationTest::Open), Some(DegradationTest::Ready)) => Ok((DegradationTest::Open, None)),
        (None | Some(DegradationTest::Open), Some(numbers)) => Ok((numbers, None)),
        (Some(words), Some(numbers)) if words == numbers => Ok((words, None)),
        (Some(_), Some(_)) => Ok((DegradationTest::Open, Some(CellFaultKind::WordsAgainstNumber))),
    }
}

fn result_in_numbers(text: &str, decimal: DecimalStyle) -> Option<DegradationTest> {
    let measure = measure_in(text);
    let days = days_in(text);
    let mut results =
        percentages(text, decimal).into_iter().map(|degraded| result_of(degraded, days, measure));
    let first = results.next()?;
    Some(if results.all(|result| result == first) { first } else { DegradationTest::Open })
}

fn result_of(degraded: Interval, days: Option<f64>, measure: Measure) -> DegradationTest {
    let reaches = |level| degraded.compare(Comparison::AtLeast, level) == Outcome::Fired;
    let passes = reaches(PASS_ANY_MEASURE) || (measure == Measure::O2OrCo2 && reaches(PASS_O2_OR_CO2));
    let misses = degraded.compare(Comparison::Below, PASS_O2_OR_CO2) == Outcome::Fired;
    let (late, early) = days.map_or((false, false), |days| (days > TEST_DAYS, days < TEST_DAYS));
    match (passes, misses) {
        (true, _) if !late => DegradationTest::Ready,
        (_, true) if !early => DegradationTest::NotReady,
        (_, _) => DegradationTest::Open,
    }
}

/// Numbers from 0 to 1 may be fractions; zero is no degradation either way.
pub(super) fn percentage_of_number(number: f64) -> Result<Interval, CellFaultKind> {
    if !(0.0..=150.0).contains(&number) {
        return Err(NOT_READY_CELL);
    }
    if number > 0.0 && number <= 1.0 {
        return Err(CellFaultKind::FractionOrPercent);
    }
    Interval::point(number).map_err(|_| NOT_READY_CELL)
}
