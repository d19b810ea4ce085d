//! Ratings: the first property with data says in which bands its value may lie.

use crate::evidence::{Evidence, Standing};
use crate::judge::compare::{hold_against, outcome_of};
use crate::judge::{Context, Used};
use crate::quantity::Outcome;
use crate::rules::{Band, Criterion, Subject};
use crate::substance::Property;

/// The bands the first property with data may lie in, and the value that was rated.
pub(crate) fn rate(context: Context, criterion: &Criterion) -> (Vec<usize>, Option<Used>) {
    for band in &criterion.bands {
        let Subject::Property(property) = band.test.subject else {
            continue;
        };
        if let Some(rated) = highest_value(context, band, property) {
            let ratings = criterion
                .bands
                .iter()
                .enumerate()
                .filter(|(_, other)| other.test.subject == band.test.subject)
                .filter(|(_, other)| outcome_of(&other.test, rated.compared) != Outcome::Clear)
                .map(|(index, _)| index)
                .collect();
            return (ratings, Some(rated));
        }
    }
    (Vec::new(), None)
}

/// Of the values of the best accepted basis, the one that reaches highest.
fn highest_value(context: Context, band: &Band, property: Property) -> Option<Used> {
    let values = context.evidence.of(property);
    let accepted = |evidence: &Evidence| {
        band.test.bases.contains(&evidence.basis) && evidence.standing == Standing::Full
    };
    let best = values.iter().filter(|evidence| accepted(evidence)).map(|evidence| evidence.basis).min()?;
    values
        .iter()
        .enumerate()
        .filter(|(_, evidence)| accepted(evidence) && evidence.basis == best)
        .max_by(|(_, one), (_, other)| one.upper_value().total_cmp(&other.upper_value()))
        .map(|(index, evidence)| {
            hold_against(context, &band.test, index, evidence, |interval| outcome_of(&band.test, interval))
        })
}
