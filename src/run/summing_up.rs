//! What a run tells at its end: options, columns, properties that no row had.

use std::collections::BTreeSet;

use crate::fault::count;
use crate::rules::{RuleSet, Weight};
use crate::run::ScreenSettings;
use crate::run::plan::Plan;
use crate::substance::UnstatedBasis;
use crate::workbook::column_letters;

pub(crate) fn options(settings: &ScreenSettings) -> Vec<(&'static str, String)> {
    let mut options = Vec::new();
    let unstated = match settings.unstated {
        UnstatedBasis::Measured => "measured",
        UnstatedBasis::Unstated => "unstated (a rank of its own)",
        UnstatedBasis::Calculated => "calculated",
    };
    options.push(("Values without a word on how they were obtained count as", unstated.to_owned()));
    if !settings.sheets.is_empty() {
        options.push(("Sheets named", settings.sheets.join(", ")));
    }
    for column in &settings.columns {
        let field = column.field.map_or("ignore", crate::substance::Field::id);
        options.push(("Column named", format!("{}={field}", column.header)));
    }
    options
}

/// Hidden sheets that were screened, a sentence each.
pub(crate) fn hidden(plan: &Plan) -> Vec<String> {
    let hidden = plan.sheets.iter().filter(|sheet| sheet.hidden() && sheet.screened.is_some());
    hidden.map(|sheet| format!("Sheet `{}` is hidden and was screened.", sheet.name)).collect()
}

/// Sheets with a header and no row to screen, a sentence each.
pub(crate) fn without_rows(plan: &Plan, screened: &[usize]) -> Vec<String> {
    let sheets = plan.sheets.iter().zip(screened).filter(|(_, rows)| **rows == 0);
    sheets
        .filter_map(|(sheet, _)| {
            let header = sheet.screened.as_ref()?.recognised.header_row + 1;
            Some(format!(
                "{}: nothing was screened: the header in row {header} was recognised, but no row below it holds a \
                 substance; if there should be one, check that the file is complete and that the header stands above the \
                 data",
                sheet.name
            ))
        })
        .collect()
}

/// Which rows were left aside, in sentences.
pub(crate) fn rows_aside(left_aside: usize, asides: Option<String>) -> Vec<String> {
    let mut sentences = Vec::new();
    if left_aside > 0 {
        sentences.push(format!(
            "{} not screened, with more fields than the header; each is among the cells that could not be read.",
            count(left_aside, "row was", "rows were")
        ));
    }
    sentences.extend(asides);
    sentences
}

pub(crate) fn column_remarks(plan: &Plan) -> Vec<String> {
    let screened = plan.sheets.iter().filter_map(|sheet| sheet.screened.as_ref());
    screened.flat_map(|screened| screened.recognised.remarks.iter().cloned()).collect()
}

pub(crate) fn unrecognised(plan: &Plan) -> Vec<String> {
    let screened = plan.sheets.iter().filter_map(|sheet| Some((sheet, sheet.screened.as_ref()?)));
    screened
        .filter(|(_, screened)| !screened.recognised.unknown.is_empty())
        .map(|(sheet, screened)| {
            let unknown = screened.recognised.unknown.iter();
            let headers: Vec<String> = unknown
                .map(|(column, header)| {
                    let why = screened.recognised.not_taken.get(column);
                    let why = why.map(|why| format!(" ({why})")).unwrap_or_default();
                    format!("{} `{}`{why}", column_letters(*column), header.replace('\n', " "))
                })
                .collect();
            format!(
                "{}: not used: {}; `--column 'Header=field'` says what a column holds",
                sheet.name,
                headers.join(", ")
            )
        })
        .collect()
}

/// Properties that deciding tests ask for and no row had, with the criteria that ask, so that a rule nobody's data
/// reach does not go unnoticed.
pub(crate) fn unreached(rules: &RuleSet, reached: &[bool]) -> Vec<String> {
    let tests = rules.rulebooks.iter().flat_map(|rulebook| {
        rulebook.criteria.iter().flat_map(move |criterion| {
            criterion.steps.iter().flat_map(move |step| {
                step.tests
                    .iter()
                    .map(move |test| (step.weight, test, format!("{} {}", rulebook.short, criterion.id)))
            })
        })
    });
    let tests: Vec<_> =
        tests.zip(reached).filter(|((weight, ..), _)| *weight != Weight::Supporting).collect();
    // A criterion may ask for a property twice, for example given and estimated.
    let had: BTreeSet<(&str, &str)> = tests
        .iter()
        .filter(|(_, reached)| **reached)
        .map(|((_, test, criterion), _)| (test.subject.title(), criterion.as_str()))
        .collect();
    let mut asked: Vec<(&'static str, Vec<String>)> = Vec::new();
    for ((_, test, criterion), _) in &tests {
        let property = test.subject.title();
        if had.contains(&(property, criterion.as_str())) {
            continue;
        }
        match asked.iter_mut().find(|(known, _)| *known == property) {
            Some((_, criteria)) if criteria.contains(criterion) => {}
            Some((_, criteria)) => criteria.push(criterion.clone()),
            None => asked.push((property, vec![criterion.clone()])),
        }
    }
    asked.into_iter().map(|(property, criteria)| format!("{property} ({})", criteria.join(", "))).collect()
}
