//! The relations file, checked.

use super::{DefaultSd, Relation, Relations, Side};
use crate::fault::{OwnerKind, RuleFaults, RuleMistake};
use crate::quantity::{Bound, Interval};
use crate::rules::RuleSource;
use crate::rules::file::{Located, Section};
use crate::rules::validate::{CHECKED, read_id, refuse_duplicate};
use crate::substance::{Basis, Property};

const SIDES: [(&str, Side); 3] =
    [("central", Side::Central), ("class", Side::Class), ("ionised", Side::Ionised)];

/// The checked relations of a file, in order.
pub(crate) fn read_relations(source: &RuleSource) -> Result<Relations, RuleFaults> {
    source.build(|file| {
        file.allow(&["relation", "default-sd"]);
        file.need("[[relation]]");
        file.need("[[default-sd]]");
        let mut names = Vec::new();
        let mut relations = Vec::new();
        for section in file.sections("relation", "[[relation]]") {
            if let Some(relation) = read_relation(&section) {
                refuse_duplicate(&section, &relation.id, &mut names, OwnerKind::Relation);
                relations.push(relation);
            }
        }
        Some(Relations { relations, default_sds: read_default_sds(file) })
    })
}

fn read_relation(section: &Section<'_>) -> Option<Relation> {
    section.allow(&[
        "id",
        "citation",
        "from",
        "to",
        "coefficients",
        "above",
        "at-least",
        "below",
        "at-most",
        "sd",
        "checked",
        "side",
        "class",
        "molar",
    ]);
    for example in [
        "id = \"veith-1979\"",
        "citation = \"Veith GD, DeFoe DL, Bergstedt BV (1979) J Fish Res Board Can 36:1040-1048\"",
        "from = \"log-kow\"",
        "to = \"bcf\"",
        "coefficients = [-0.70, 0.85]",
        "sd = 0.5",
        "checked = \"second-hand\"",
        "class = \"neutral organic substances\"",
    ] {
        section.need(example);
    }
    let properties = Property::ALL.map(|property| (property.id(), property));
    let (id, citation, class) = (read_id(section), section.text("citation"), section.text("class"));
    let (from, to) = (section.word("from", &properties), section.word("to", &properties));
    let coefficients = read_coefficients(section);
    let domain = read_domain(section);
    let (sd, checked) = (read_sd(section), section.word("checked", &CHECKED));
    let side = section.word("side", &SIDES).unwrap_or(Side::Central);
    Some(Relation {
        id: id?,
        citation: citation?.value,
        from: from?,
        to: to?,
        coefficients,
        domain: domain?,
        sd: sd?,
        checked: checked?,
        side,
        class: class?.value,
        molar: section.flag("molar"),
    })
}

fn read_coefficients(section: &Section<'_>) -> Vec<f64> {
    let coefficients = section.numbers("coefficients").unwrap_or_default();
    if coefficients.is_empty() && section.is_empty_list("coefficients") {
        let span = section.key_span("coefficients").unwrap_or(section.span());
        let key = "coefficients".to_owned();
        section.report(span, RuleMistake::EmptyList { key });
    }
    coefficients.into_iter().map(|number| number.value).collect()
}

/// A domain needs two ends: an equation without one would be applied where nobody tried it.
fn read_domain(section: &Section<'_>) -> Option<Interval> {
    let [at_least, above] = ["at-least", "above"].map(|key| section.number(key));
    let [at_most, below] = ["at-most", "below"].map(|key| section.number(key));
    let low = read_end(section, at_least, above, "at-least = 1")?;
    let high = read_end(section, at_most, below, "at-most = 6")?;
    let domain = Interval::new(low, high);
    if domain.is_err() {
        let span = ["at-most", "below"].into_iter().find_map(|key| section.key_span(key));
        section.report(span.unwrap_or(section.span()), RuleMistake::ReversedRange);
    }
    domain.ok()
}

fn read_end(
    section: &Section<'_>,
    included: Option<Located<f64>>,
    excluded: Option<Located<f64>>,
    example: &'static str,
) -> Option<Bound> {
    match (included, excluded) {
        (Some(end), None) => Some(Bound::Included(end.value)),
        (None, Some(end)) => Some(Bound::Excluded(end.value)),
        (None, None) => {
            section.need(example);
            None
        }
        (Some(_), Some(second)) => {
            let belongs = "where the other end of the domain is not given already";
            let key = if example.starts_with("at-least") { "above" } else { "below" };
            section.report(second.span, RuleMistake::OutOfPlace { key, belongs });
            None
        }
    }
}

fn read_sd(section: &Section<'_>) -> Option<f64> {
    let sd = section.number("sd")?;
    if sd.value < 0.0 {
        let mistake =
            RuleMistake::Impossible { found: sd.value.to_string(), property: "a standard deviation" };
        section.report(sd.span, mistake);
    }
    Some(sd.value)
}

fn read_default_sds(file: &Section<'_>) -> Vec<DefaultSd> {
    let sections = file.sections("default-sd", "[[default-sd]]");
    let defaults: Vec<DefaultSd> = sections.iter().filter_map(read_default_sd).collect();
    let for_all_others = |default: &DefaultSd| {
        default.property == "any" && default.bases.is_empty() && default.above.is_none()
    };
    if let (Some(last), false) = (sections.last(), defaults.iter().any(for_all_others)) {
        last.report(last.span(), RuleMistake::NoDefaultSd);
    }
    defaults
}

fn read_default_sd(section: &Section<'_>) -> Option<DefaultSd> {
    section.allow(&["property", "basis", "above", "sd", "source"]);
    section.need("property = \"bcf\"");
    section.need("sd = 0.3");
    section.need("source = \"assumed\"");
    let mut names: Vec<(&str, &str)> =
        Property::ALL.iter().map(|property| (property.id(), property.id())).collect();
    names.extend([("half-life", "half-life"), ("any", "any")]);
    let property = section.word("property", &names);
    let bases = section.words("basis", &Basis::ALL.map(|basis| (basis.word(), basis)));
    let (sd, source) = (read_sd(section), section.text("source"));
    let above = section.number("above");
    Some(DefaultSd {
        property: property?.to_owned(),
        bases: bases.unwrap_or_default(),
        above: above.map(|number| number.value),
        sd: sd?,
        source: source?.value,
    })
}
