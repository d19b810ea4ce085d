//! Which rule files a choice means.

use kowledger::fault::Refusal;
use kowledger::rules::{RuleSet, check_paths, load_rule_set, summaries};

fn ids(rule_set: &RuleSet) -> Vec<&str> {
    rule_set.rulebooks.iter().map(|rulebook| rulebook.id.as_str()).collect()
}

fn choose(choices: &[&str]) -> Result<RuleSet, Refusal> {
    let choices: Vec<String> = choices.iter().map(|choice| (*choice).to_owned()).collect();
    load_rule_set(&choices)
}

#[test]
fn without_a_choice_every_built_in_rulebook_is_taken_in_order() {
    let rule_set = choose(&[]).unwrap();
    let expected =
        ["eu-reach-pbt", "eu-clp-pbt-pmt", "un-stockholm-annex-d", "ca-persistence-bioaccumulation"];
    assert_eq!(ids(&rule_set), expected);
    assert_eq!(ids(&choose(&["all"]).unwrap()), expected);
}

#[test]
fn a_choice_is_taken_once_and_in_the_order_given() {
    let rule_set = choose(&["un-stockholm-annex-d", "eu-reach-pbt", "un-stockholm-annex-d"]).unwrap();
    assert_eq!(ids(&rule_set), ["un-stockholm-annex-d", "eu-reach-pbt"]);
}

#[test]
fn every_applied_file_is_kept_for_the_record() {
    let rule_set = choose(&["eu-reach-pbt"]).unwrap();
    let names: Vec<_> = rule_set.texts.iter().map(|text| text.name.as_str()).collect();
    assert_eq!(names, ["built in: eu-reach-pbt", "built in: cautions", "built in: relations"]);
    assert!(rule_set.texts.iter().all(|text| !text.text.is_empty()));
}

#[test]
fn an_unknown_id_is_answered_with_the_nearest_one_and_the_list() {
    insta::assert_snapshot!(choose(&["eu-reach-pbr"]).unwrap_err());
    insta::assert_snapshot!(choose(&["kinetics"]).unwrap_err());
}

#[test]
fn the_list_counts_how_the_limits_were_checked() {
    insta::assert_debug_snapshot!(summaries().unwrap());
}

#[test]
fn a_file_and_a_folder_are_read_from_disk() {
    let folder = tempfile::tempdir().unwrap();
    let file = folder.path().join("own.toml");
    std::fs::write(&file, OWN_RULEBOOK).unwrap();
    std::fs::write(folder.path().join("readme.txt"), "no rulebook").unwrap();
    for path in [&file, &folder.path().to_owned()] {
        let rule_set = choose(&[path.to_str().unwrap()]).unwrap();
        assert_eq!(ids(&rule_set), ["house-rules"]);
        assert_eq!(rule_set.texts[0].name, "own.toml");
        assert_eq!(check_paths(std::slice::from_ref(path)).unwrap()[0].short, "HOUSE");
    }
}

#[test]
fn a_folder_may_bring_its_own_cautions_and_relations() {
    let folder = tempfile::tempdir().unwrap();
    std::fs::create_dir(folder.path().join("rulebooks")).unwrap();
    std::fs::write(folder.path().join("rulebooks").join("own.toml"), OWN_RULEBOOK).unwrap();
    std::fs::write(folder.path().join("cautions.toml"), OWN_CAUTIONS).unwrap();
    let rule_set = choose(&[folder.path().to_str().unwrap()]).unwrap();
    assert_eq!(rule_set.cautions.len(), 1);
    assert_eq!(rule_set.cautions[0].id, "house-caution");
    assert!(rule_set.relations.relations.len() > 1);
}

#[test]
fn a_faulty_file_beside_a_sound_one_leaves_nothing_applied() {
    let folder = tempfile::tempdir().unwrap();
    std::fs::write(folder.path().join("own.toml"), OWN_RULEBOOK).unwrap();
    std::fs::write(folder.path().join("worse.toml"), OWN_RULEBOOK.replace("above = 4.5", "above = "))
        .unwrap();
    assert!(matches!(choose(&[folder.path().to_str().unwrap()]), Err(Refusal::Rules(_))));
}

pub const OWN_RULEBOOK: &str = r#"
[rulebook]
id = "house-rules"
short = "HOUSE"
title = "House rules"
source = "Purchasing manual, chapter 7"
edition = 2026-01-31
strongest = "screening"

[[criterion]]
id = "B"
title = "Bioaccumulative"

[[criterion.step]]
weight = "screening"

[[criterion.step.test]]
property = "log-kow"
above = 4.5
source = "Purchasing manual, 7.2"
checked = "seen"
"#;

const OWN_CAUTIONS: &str = r#"
[[caution]]
id = "house-caution"
sentence = "Bought from one supplier only."
source = "Purchasing manual, 7.3"
name-patterns = ["siloxane"]
blocks = []
"#;
