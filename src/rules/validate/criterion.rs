//! The criteria of a rulebook: their steps, bands, or the sentence that stands for them.

use super::test::read_test;
use crate::fault::{OwnerKind, RuleMistake};
use crate::rules::file::Section;
use crate::rules::{Band, ClearsOn, Combine, Criterion, Decides, Guards, OnlyIf, Step, Weight};

const WEIGHTS: [(&str, Weight); 4] = [
    ("definitive", Weight::Definitive),
    ("screening", Weight::Screening),
    ("concern", Weight::Concern),
    ("supporting", Weight::Supporting),
];
const COMBINES: [(&str, Combine); 2] = [("any", Combine::Any), ("all", Combine::All)];
const DECIDES: [(&str, Decides); 3] = [("both", Decides::Both), ("in", Decides::In), ("out", Decides::Out)];
const GUARDS: [(&str, Guards); 2] = [("fired", Guards::Fired), ("fired-or-open", Guards::FiredOrOpen)];
const CLEARS_ON: [(&str, ClearsOn); 2] = [("all", ClearsOn::All), ("some", ClearsOn::Some)];
const ONLY_IF: [(&str, OnlyIf); 1] = [("no-data-before", OnlyIf::NoDataBefore)];

/// The criteria of a file, in order. One with a fault is left out, or stands with what remains of it.
pub(super) fn read_criteria(file: &Section<'_>) -> Vec<Criterion> {
    let mut names: Vec<(String, usize)> = Vec::new();
    let mut criteria = Vec::new();
    for section in file.sections("criterion", "[[criterion]]") {
        if let Some(criterion) = read_criterion(&section) {
            refuse_duplicate(&section, &criterion.id, &mut names, OwnerKind::Criterion);
            criteria.push(criterion);
        }
    }
    criteria
}

/// Refuses a name that an earlier table bears; else remembers it with its line.
pub(crate) fn refuse_duplicate(
    section: &Section<'_>,
    name: &str,
    names: &mut Vec<(String, usize)>,
    kind: OwnerKind,
) {
    match names.iter().find(|(taken, _)| taken == name) {
        Some((_, line)) => {
            let span = section.text("id").map_or_else(|| section.span(), |id| id.span);
            let mistake = RuleMistake::DuplicateName { name: name.to_owned(), first: kind, line: *line };
            section.report(span, mistake);
        }
        None => names.push((name.to_owned(), section.line(&section.span()))),
    }
}

fn read_criterion(section: &Section<'_>) -> Option<Criterion> {
    section.allow(&["id", "title", "assess", "step", "band"]);
    section.need("id = \"B\"");
    section.need("title = \"Bioaccumulative\"");
    let (id, title) = (section.text("id"), section.text("title"));
    let assess = section.text("assess");
    let steps = read_steps(section);
    let bands = read_bands(section);
    let id = id?.value;
    let answers: Vec<_> =
        ["assess", "step", "band"].into_iter().filter_map(|key| section.key_span(key)).collect();
    match answers.as_slice() {
        [] => {
            let criterion = id.clone();
            section.report(section.span(), RuleMistake::EmptyCriterion { criterion });
        }
        [_] => {}
        [_, second, ..] => {
            let criterion = id.clone();
            section.report(second.clone(), RuleMistake::MixedCriterion { criterion });
        }
    }
    Some(Criterion { id, title: title?.value, assess: assess.map(|sentence| sentence.value), steps, bands })
}

fn read_steps(section: &Section<'_>) -> Vec<Step> {
    section.sections("step", "[[criterion.step]]").iter().filter_map(read_step).collect()
}

fn read_step(section: &Section<'_>) -> Option<Step> {
    section.allow(&["weight", "combine", "decides", "guards", "clears-on", "only-if", "test"]);
    section.need("weight = \"definitive\"");
    let weight = section.word("weight", &WEIGHTS);
    let decides = section.word("decides", &DECIDES);
    let guards = section.word("guards", &GUARDS);
    let only_if = section.word("only-if", &ONLY_IF);
    let tests = section.sections("test", "[[criterion.step.test]]");
    if tests.is_empty() {
        section.report(section.span(), RuleMistake::EmptyStep);
    }
    let combine = section.word("combine", &COMBINES);
    if tests.len() > 1 && section.key_span("combine").is_none() {
        section.report(section.span(), RuleMistake::NoCombine);
    }
    let combine = combine.unwrap_or(Combine::Any);
    let clears_on = section.word("clears-on", &CLEARS_ON).unwrap_or(ClearsOn::All);
    refuse_what_the_step_cannot_do(section, weight, combine);
    let tests = tests.iter().filter_map(|test| read_test(test, &[])).collect();
    let weight = weight?;
    // A step of concern that guards nothing would do nothing at all.
    let default_guards = match weight {
        Weight::Concern => Guards::Fired,
        Weight::Definitive | Weight::Screening | Weight::Supporting => Guards::Never,
    };
    Some(Step {
        weight,
        combine,
        decides: decides.unwrap_or(Decides::Both),
        guards: guards.unwrap_or(default_guards),
        clears_on,
        only_if: only_if.unwrap_or(OnlyIf::Always),
        tests,
    })
}

fn refuse_what_the_step_cannot_do(section: &Section<'_>, weight: Option<Weight>, combine: Combine) {
    let refuse = |key: &'static str, belongs: &'static str| {
        if let Some(span) = section.key_span(key) {
            section.report(span, RuleMistake::OutOfPlace { key, belongs });
        }
    };
    match weight {
        Some(Weight::Supporting) => {
            refuse("guards", "to steps that are definitive, screening or of concern");
            refuse("decides", "to steps that are definitive or screening");
        }
        Some(Weight::Concern) => refuse("decides", "to steps that are definitive or screening"),
        Some(Weight::Definitive | Weight::Screening) | None => {}
    }
    match combine {
        Combine::All => refuse("clears-on", "to steps with `combine = \"any\"`"),
        Combine::Any => {}
    }
}

fn read_bands(section: &Section<'_>) -> Vec<Band> {
    let mut bands = Vec::new();
    for band in section.sections("band", "[[criterion.band]]") {
        band.need("rating = \"rating 3\"");
        let rating = band.text("rating");
        let test = read_test(&band, &["rating"]);
        if let (Some(rating), Some(test)) = (rating, test) {
            bands.push(Band { rating: rating.value, test });
        }
    }
    bands
}
