//! Every limit of the built-in rulebooks against a table written by hand from the published criteria, not from the rule
//! files: criterion, step, property, comparison, number in the canonical unit, and how the limit was checked.
//!
//! Sources: Regulation (EC) No 1907/2006, Annex XIII; Regulation (EC) No 1272/2008, Annex I, 4.3 and 4.4; Stockholm
//! Convention, Annex D; SOR/2000-107. Screening values: agency guidance R.11, second-hand.

use kowledger::quantity::{Comparison, DAYS_PER_MONTH};
use kowledger::rules::{
    Checked, ClearsOn, Combine, Decides, DesignationPart, Guards, Limit, OnlyIf, Rulebook, Step, Test,
    Weight, load_rule_set,
};
use kowledger::substance::{Basis, DegradationTest};

fn rulebook(id: &str) -> Rulebook {
    let mut rule_set = load_rule_set(&[id.to_owned()]).unwrap();
    rule_set.rulebooks.remove(0)
}

/// A test in one line: property, comparison and number, days for inherent tests, bases, `optional`, checked.
fn line(test: &Test) -> String {
    let limit = match &test.limit {
        Limit::Number { comparison, value } => format!("{} {value}", sign(*comparison)),
        Limit::Between { low, high } => format!("{low}..{high}"),
        Limit::AnyOfWords(codes) => codes.join(" "),
        Limit::Is(DegradationTest::NotReady) => "not ready".to_owned(),
        Limit::Is(other) => format!("{other:?}"),
    };
    let inherent = match (&test.guideline, test.within) {
        (Some(guideline), Some(days)) => format!(" {guideline} {days} d"),
        (None, None) => String::new(),
        other => format!(" {other:?}"),
    };
    let given = [Basis::Measured, Basis::Unstated, Basis::Calculated];
    let bases = if test.bases.iter().copied().eq(Basis::ALL) {
        String::new()
    } else if test.bases.iter().copied().eq(given) {
        " given".to_owned()
    } else {
        let words: Vec<_> = test.bases.iter().map(|basis| basis.word()).collect();
        format!(" {}", words.join("/"))
    };
    let optional = if test.optional { " optional" } else { "" };
    let checked = test.checked.word();
    format!("{} {limit}{inherent}{bases}{optional}, {checked}", test.subject.id())
}

fn sign(comparison: Comparison) -> &'static str {
    match comparison {
        Comparison::Above => ">",
        Comparison::AtLeast => ">=",
        Comparison::Below => "<",
        Comparison::AtMost => "<=",
    }
}

/// A step in one line: weight, how it counts, and what is not the default.
fn head(step: &Step) -> String {
    let mut words = vec![match step.weight {
        Weight::Definitive => "def",
        Weight::Screening => "scr",
        Weight::Concern => "con",
        Weight::Supporting => "sup",
    }];
    if step.tests.len() > 1 {
        words.push(match step.combine {
            Combine::Any => "any",
            Combine::All => "all",
        });
    }
    words.extend(match step.decides {
        Decides::Both => None,
        Decides::In => Some("decides in"),
        Decides::Out => Some("decides out"),
    });
    words.extend(match step.guards {
        Guards::Never => None,
        Guards::Fired => Some("guards fired"),
        Guards::FiredOrOpen => Some("guards fired-or-open"),
    });
    words.extend(match step.clears_on {
        ClearsOn::All => None,
        ClearsOn::Some => Some("clears on some"),
    });
    words.extend(match step.only_if {
        OnlyIf::Always => None,
        OnlyIf::NoDataBefore => Some("if none before"),
    });
    words.join(" ")
}

/// The criterion as lines: each step's head, then its tests.
fn lines(rulebook: &Rulebook, criterion: &str) -> Vec<String> {
    let criterion = rulebook.criteria.iter().find(|found| found.id == criterion).unwrap();
    let in_steps = criterion
        .steps
        .iter()
        .flat_map(|step| std::iter::once(head(step)).chain(step.tests.iter().map(line)));
    in_steps.collect()
}

fn ids(rulebook: &Rulebook) -> Vec<&str> {
    rulebook.criteria.iter().map(|criterion| criterion.id.as_str()).collect()
}

/// A designation in one line: `PBT = all of P B T, stated by EUH440`.
fn designations(rulebook: &Rulebook) -> Vec<String> {
    let name = |part: &DesignationPart| match part {
        DesignationPart::Criterion(index) => rulebook.criteria[*index].id.clone(),
        DesignationPart::Designation(index) => rulebook.designations[*index].id.clone(),
    };
    let line = |designation: &kowledger::rules::Designation| {
        assert_eq!(designation.combine, Combine::All);
        let parts: Vec<_> = designation.parts.iter().map(name).collect();
        format!("{} = {} [{}]", designation.id, parts.join(", "), designation.stated_by.join(" "))
    };
    rulebook.designations.iter().map(line).collect()
}

/// The steps of P and vP: half-lives in days, then degradation tests.
fn persistence([water, sediment, soil, marine_water, marine_sediment]: [u32; 5]) -> Vec<String> {
    vec![
        "def any".to_owned(),
        format!("half-life-fresh-water > {water}, seen"),
        format!("half-life-fresh-sediment > {sediment}, seen"),
        format!("half-life-soil > {soil}, seen"),
        format!("half-life-marine-water > {marine_water} optional, seen"),
        format!("half-life-marine-sediment > {marine_sediment} optional, seen"),
        "scr".to_owned(),
        "ready-biodegradability not ready, second-hand".to_owned(),
        "scr any decides out clears on some".to_owned(),
        "inherent-biodegradability < 70 OECD 302B 7 d, memory".to_owned(),
        "inherent-biodegradability < 70 OECD 302C 14 d, memory".to_owned(),
    ]
}

fn bioaccumulation(bcf: u32, molar_mass: u32, molar_mass_checked: &str) -> Vec<String> {
    vec![
        "def".to_owned(),
        format!("bcf > {bcf} given, seen"),
        "scr all decides in guards fired-or-open".to_owned(),
        "log-koa > 5, second-hand".to_owned(),
        "log-kow > 2, second-hand".to_owned(),
        "con any guards fired".to_owned(),
        "bmf > 1, memory".to_owned(),
        "tmf > 1, memory".to_owned(),
        format!("baf > {bcf}, memory"),
        "scr".to_owned(),
        "log-kow > 4.5, second-hand".to_owned(),
        "sup".to_owned(),
        format!("bcf > {bcf} estimated, seen"),
        "sup any".to_owned(),
        "log-kow > 10 calculated/estimated, second-hand".to_owned(),
        format!("molar-mass > {molar_mass}, {molar_mass_checked}"),
    ]
}

fn toxicity(statements: &str) -> Vec<String> {
    vec![
        "def any decides in".to_owned(),
        format!("hazard-statements {statements}, seen"),
        "long-term-toxicity < 0.01 given, seen".to_owned(),
        "acute-toxicity < 0.01 given, seen".to_owned(),
        "scr decides in".to_owned(),
        "acute-toxicity < 0.1 given, seen".to_owned(),
        "scr any decides out".to_owned(),
        format!("hazard-statements {statements}, seen"),
        "long-term-toxicity < 0.01 given, seen".to_owned(),
        "sup".to_owned(),
        "acute-toxicity < 0.1 estimated, seen".to_owned(),
    ]
}

#[test]
fn reach_has_the_limits_of_annex_xiii() {
    let reach = rulebook("eu-reach-pbt");
    assert_eq!(ids(&reach), ["P", "vP", "B", "vB", "T"]);
    assert_eq!(lines(&reach, "P"), persistence([40, 120, 120, 60, 180]));
    assert_eq!(lines(&reach, "vP"), persistence([60, 180, 180, 60, 180]));
    assert_eq!(lines(&reach, "B"), bioaccumulation(2000, 1100, "second-hand"));
    assert_eq!(lines(&reach, "vB"), bioaccumulation(5000, 700, "memory"));
    assert_eq!(lines(&reach, "T"), toxicity("H340 H350 H360 H361 H372 H373"));
    assert_eq!(designations(&reach), ["PBT = P, B, T []", "vPvB = vP, vB []"]);
}

#[test]
fn clp_has_the_limits_of_annex_i_and_its_wider_toxicity() {
    let clp = rulebook("eu-clp-pbt-pmt");
    assert_eq!(ids(&clp), ["P", "vP", "B", "vB", "M", "vM", "T"]);
    assert_eq!(lines(&clp, "P"), persistence([40, 120, 120, 60, 180]));
    assert_eq!(lines(&clp, "vP"), persistence([60, 180, 180, 60, 180]));
    assert_eq!(lines(&clp, "B"), bioaccumulation(2000, 1100, "second-hand"));
    assert_eq!(lines(&clp, "vB"), bioaccumulation(5000, 700, "memory"));
    for (criterion, koc) in [("M", 1000), ("vM", 100)] {
        let expected = [
            "def".to_owned(),
            format!("koc < {koc} given, seen"),
            "scr".to_owned(),
            format!("koc < {koc} estimated, seen"),
        ];
        assert_eq!(lines(&clp, criterion), expected);
    }
    assert_eq!(lines(&clp, "T"), toxicity("H340 H350 H360 H361 H372 H373 EUH380 EUH430"));
    assert_eq!(
        designations(&clp),
        [
            "PBT = P, B, T [EUH440]",
            "vPvB = vP, vB [EUH441]",
            "PMT = P, M, T [EUH450]",
            "vPvM = vP, vM [EUH451]",
        ]
    );
}

#[test]
fn both_eu_rulebooks_compare_half_lives_at_12_degrees_and_leave_inorganics_out() {
    for (id, edition) in [("eu-reach-pbt", "2011-03-15"), ("eu-clp-pbt-pmt", "2023-03-31")] {
        let rulebook = rulebook(id);
        let reference = rulebook.half_life_at.unwrap();
        let numbers = [reference.temperature, reference.activation_energy, reference.unstated_temperature];
        assert_eq!(numbers.map(|number| number.to_string()), ["12", "65.4", "20"]);
        assert_eq!(rulebook.mixture_limit.map(|limit| limit.to_string()).as_deref(), Some("0.1"));
        assert_eq!(rulebook.out_of_scope, ["inorganic"]);
        assert_eq!(rulebook.strongest, Weight::Definitive);
        assert_eq!(rulebook.edition.to_string(), edition);
    }
}

#[test]
fn stockholm_has_the_limits_of_annex_d_in_months_and_nothing_definitive() {
    let stockholm = rulebook("un-stockholm-annex-d");
    let (two, six) = (2.0 * DAYS_PER_MONTH, 6.0 * DAYS_PER_MONTH);
    assert_eq!(ids(&stockholm), ["P", "B", "LRT", "adverse effects"]);
    assert_eq!(
        lines(&stockholm, "P"),
        [
            "def any".to_owned(),
            format!("half-life-water > {two}, seen"),
            format!("half-life-soil > {six}, seen"),
            format!("half-life-sediment > {six}, seen"),
            "scr decides out".to_owned(),
            "ready-biodegradability not ready, second-hand".to_owned(),
        ]
    );
    assert_eq!(
        lines(&stockholm, "B"),
        [
            "def any clears on some",
            "bcf > 5000 given, seen",
            "baf > 5000 given, seen",
            "scr if none before",
            "log-kow > 5, seen",
        ]
    );
    assert_eq!(lines(&stockholm, "LRT"), ["def decides in", "half-life-air > 2, seen"]);
    assert!(stockholm.criteria[3].assess.is_some());
    assert_eq!(designations(&stockholm), ["Annex D indicators = P, B, LRT []"]);
    assert_eq!(stockholm.strongest, Weight::Screening);
    assert_eq!((stockholm.half_life_at, stockholm.mixture_limit), (None, None));
    let texts: Vec<_> = stockholm.tests().map(|test| test.limit_text.as_str()).collect();
    assert_eq!(texts[..3], ["2 months", "6 months", "6 months"]);
}

#[test]
fn canada_has_inclusive_limits_and_a_strict_order() {
    let canada = rulebook("ca-persistence-bioaccumulation");
    assert_eq!(ids(&canada), ["P", "B"]);
    assert_eq!(
        lines(&canada, "P"),
        [
            "def any",
            "half-life-air >= 2, seen",
            "half-life-water >= 182, seen",
            "half-life-sediment >= 365, seen",
            "half-life-soil >= 182, seen",
            "scr decides out",
            "ready-biodegradability not ready, second-hand",
        ]
    );
    assert_eq!(
        lines(&canada, "B"),
        [
            "def",
            "baf >= 5000 given, seen",
            "def if none before",
            "bcf >= 5000 given, seen",
            "scr if none before",
            "log-kow >= 5, seen",
        ]
    );
    assert_eq!(designations(&canada), ["PB = P, B []"]);
    assert_eq!(canada.strongest, Weight::Definitive);
    assert!(canada.out_of_scope.is_empty());
    assert_eq!(canada.edition.to_string(), "2006-03-22");
}

#[test]
fn screening_values_that_are_not_in_the_law_say_so() {
    for id in ["eu-reach-pbt", "eu-clp-pbt-pmt"] {
        for test in rulebook(id).tests() {
            let is_agency_value = matches!(
                test.subject.id(),
                "log-kow" | "log-koa" | "ready-biodegradability" | "inherent-biodegradability" | "molar-mass"
            );
            if is_agency_value {
                assert!(test.source.starts_with("Not in the law"), "{test:?}");
                assert_ne!(test.checked, Checked::Seen, "{test:?}");
            }
        }
    }
}
