//! The cells that sum up a row: the log Kow used, the cautions, the deciding data.

use crate::judge::{Deciding, Decision, Verdict};
use crate::quantity::{Unit, format_interval};
use crate::reasoning::Told;
use crate::reasoning::value::{listed, titles};
use crate::substance::Identity;

/// The three log Kow cells: value, SD, basis. Empty where no log Kow is known.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct LogKowCells {
    /// A single value.
    pub number: Option<f64>,
    /// A range or an open interval.
    pub text: String,
    /// Its standard deviation.
    pub sd: Option<f64>,
    /// Its basis and cell.
    pub basis: String,
}

/// The log Kow used in the bioaccumulation direction.
pub fn log_kow_cells(told: Told) -> LogKowCells {
    let Some(evidence) = told.evidence.log_kow_used() else {
        return LogKowCells::default();
    };
    let number = evidence.interval.single();
    LogKowCells {
        number,
        text: if number.is_some() { String::new() } else { format_interval(evidence.interval, Unit::One) },
        sd: evidence.sd,
        basis: evidence.basis.word().to_owned(),
    }
}

/// The sentences of the cautions that the row raises.
pub fn cautions_text(told: Told) -> String {
    let sentences: Vec<String> = told
        .judgement
        .cautions
        .iter()
        .filter_map(|raised| {
            let caution = told.rules.cautions.get(raised.caution)?;
            Some(format!("{}: {} ({})", caution.id, caution.sentence.trim_end_matches('.'), raised.reason))
        })
        .collect();
    if sentences.is_empty() {
        return "none raised; looked at were the words of the name and the type, the formula (inorganic or not) and the data, not the structure".to_owned();
    }
    sentences.join("; ")
}

/// What would settle the row's open criteria, and which: `BCF (REACH B, REACH vB); ...`.
pub fn deciding_text(told: Told) -> String {
    let mut groups: Vec<(String, Vec<String>)> = Vec::new();
    for book in told.books() {
        for (criterion, judged) in book.criteria() {
            let open = matches!(judged.verdict, Verdict::Unresolved | Verdict::NoData);
            if !open || matches!(judged.decision, Decision::Assess | Decision::Rating) {
                continue;
            }
            let data = judged.deciding.as_ref().map_or(String::new(), deciding_phrase);
            let name = format!("{} {}", book.rulebook.short, criterion.id);
            match groups.iter_mut().find(|(known, _)| *known == data) {
                Some((_, names)) => names.push(name),
                None => groups.push((data, vec![name])),
            }
        }
    }
    let mut parts: Vec<String> = match told.substance.identity {
        Identity::Identified => Vec::new(),
        Identity::NameAlone | Identity::RepairedDate | Identity::BareNumber | Identity::NotIdentified
            if groups.is_empty() =>
        {
            Vec::new()
        }
        Identity::NameAlone | Identity::RepairedDate | Identity::BareNumber | Identity::NotIdentified => {
            vec!["first a CAS number, EC number or structure that says which substance it is".to_owned()]
        }
    };
    let data: Vec<String> =
        groups.into_iter().map(|(data, names)| format!("{data} ({})", names.join(", "))).collect();
    parts.extend(data);
    parts.join("; ")
}

/// The data that would settle an open criterion, for a cell.
pub(crate) fn deciding_phrase(deciding: &Deciding) -> String {
    match deciding {
        Deciding::Data(subjects) => listed(&titles(subjects.iter().copied())),
        Deciding::Perhaps(subjects) => {
            const NAMED: usize = 3;
            let titles = titles(subjects.iter().copied());
            let named = if titles.len() > NAMED { "any datum".to_owned() } else { titles.join(" or ") };
            format!("{named} (could show concern, not clear)")
        }
        Deciding::ExpertJudgement => "expert judgement".to_owned(),
    }
}
