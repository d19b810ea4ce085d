//! What a faulty rule file is answered: one small change to a sound file a kind of mistake, and the whole message.

use std::path::PathBuf;

use kowledger::fault::Drawing;
use kowledger::rules::check_paths;

/// A rulebook that is right, with every kind of thing in it that the changes below touch.
const SOUND: &str = include_str!("sound.toml");

/// The message for the sound rulebook with `old` replaced by `new`, without the folder in the paths.
fn answer_to(old: &str, new: &str) -> String {
    assert!(SOUND.contains(old), "the sound rulebook has no `{old}`");
    answer_to_file("house.toml", SOUND.replacen(old, new, 1).as_bytes())
}

fn answer_to_file(name: &str, content: &[u8]) -> String {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join(name);
    std::fs::write(&path, content).unwrap();
    answer_to_paths(&folder, &[path])
}

fn answer_to_paths(folder: &tempfile::TempDir, paths: &[PathBuf]) -> String {
    let message = check_paths(paths).expect_err("the file is faulty").to_string();
    let inside = format!("{}/", folder.path().display());
    message.replace(&inside, "").replace(&folder.path().display().to_string(), "folder")
}

/// One test a mistake: its name, what is replaced by what in the sound rulebook.
macro_rules! mistakes {
    ($($name:ident: $old:expr => $new:expr;)+) => {
        $(
            #[test]
            fn $name() {
                insta::assert_snapshot!(stringify!($name), answer_to($old, $new));
            }
        )+
    };
}

#[test]
fn the_sound_rulebook_has_no_fault() {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join("house.toml");
    std::fs::write(&path, SOUND).unwrap();
    let summaries = check_paths(&[path]).unwrap();
    assert_eq!((summaries[0].seen, summaries[0].second_hand, summaries[0].memory), (7, 1, 1));
}

mistakes! {
    broken_toml: "above = \"40 d\"" => "above = 40 d";
    a_key_given_twice: "strongest = \"definitive\"" => "strongest = \"definitive\"\nstrongest = \"screening\"";
    an_unknown_key_close_to_a_known_one: "above = \"40 d\"" => "abvoe = \"40 d\"";
    an_unknown_key_close_to_none: "short = \"HOUSE\"" => "short = \"HOUSE\"\ncolour = \"red\"";
    a_misspelt_head: "[rulebook]" => "[rulebok]";
    a_missing_key_of_the_head: "edition = 2026-01-31\n" => "";
    a_limit_without_source: "source = \"Manual, 1.1\"\n" => "";
    a_limit_without_checked: "source = \"Manual, 1.1\"\nchecked = \"seen\"" => "source = \"Manual, 1.1\"";
    a_number_where_text_belongs: "title = \"House rules\"" => "title = 7";
    a_text_where_a_list_belongs: "basis = [\"measured\", \"unstated\"]" => "basis = \"measured\"";
    an_empty_text: "title = \"House rules\"" => "title = \" \"";
    an_empty_list: "basis = [\"measured\", \"unstated\"]" => "basis = []";
    an_id_with_spaces: "id = \"house-rules\"" => "id = \"House rules\"";
    a_day_the_calendar_lacks: "edition = 2026-01-31" => "edition = 2023-02-30";
    a_day_in_quotes: "edition = 2026-01-31" => "edition = \"2026-01-31\"";
    a_day_with_a_time: "edition = 2026-01-31" => "edition = 2026-01-31T12:00:00";
    an_unknown_weight: "weight = \"screening\"" => "weight = \"screeming\"";
    an_unknown_property: "property = \"bcf\"" => "property = \"bfc\"";
    an_unknown_property_close_to_none: "property = \"bcf\"" => "property = \"retention-time\"";
    an_unknown_basis: "\"unstated\"]" => "\"guessed\"]";
    an_unknown_caution: "out-of-scope = [\"inorganic\"]" => "out-of-scope = [\"inorganics\"]";
    a_definitive_rulebook_of_concern: "strongest = \"definitive\"" => "strongest = \"concern\"";
    a_limit_without_unit: "above = \"2000 L/kg\"" => "above = 2000";
    a_limit_with_a_unit_of_something_else: "above = \"2000 L/kg\"" => "above = \"2000 d\"";
    a_limit_with_an_unknown_unit: "above = \"2000 L/kg\"" => "above = \"2000 furlong\"";
    a_limit_with_a_sign: "above = \"2000 L/kg\"" => "above = \"> 2000 L/kg\"";
    a_limit_with_a_comma: "above = \"2000 L/kg\"" => "above = \"2,000 L/kg\"";
    a_negative_half_life: "above = \"40 d\"" => "above = \"-40 d\"";
    a_limit_without_end: "above = 4.5" => "above = inf";
    a_test_without_limit: "above = 4.5\n" => "";
    a_test_with_two_limits: "above = 4.5\n" => "above = 4.5\nat-most = 10\n";
    a_range_the_wrong_way_round: "between = [3, 4]" => "between = [4, 3]";
    a_range_of_three: "between = [3, 4]" => "between = [3, 4, 5]";
    clear_below_above_the_limit: "clear-below = \"1000 L/kg\"" => "clear-below = \"5000 L/kg\"";
    clear_below_a_lower_limit: "below = \"0.01 mg/L\"" => "below = \"0.01 mg/L\"\nclear-below = \"0.001 mg/L\"";
    a_word_for_a_number: "above = 4.5" => "is = \"not ready\"";
    statements_for_a_number: "above = 4.5" => "any-of-words = [\"H350\"]";
    a_number_for_words: "is = \"not ready\"" => "above = 4";
    a_number_for_statements: "any-of-words = [\"H350\", \"H360\"]" => "at-least = 1";
    an_unknown_word_for_readiness: "is = \"not ready\"" => "is = \"inherent\"";
    a_statement_code_of_the_wrong_form: "\"H350\"" => "\"Carc. 1B\"";
    a_guideline_beside_another_property: "above = 4.5\n" => "above = 4.5\nguideline = \"OECD 302B\"\n";
    two_tests_without_combine: "combine = \"any\"\n" => "";
    clears_on_where_all_must_fire: "combine = \"any\"" => "combine = \"all\"\nclears-on = \"some\"";
    guards_on_a_supporting_step: "weight = \"supporting\"" => "weight = \"supporting\"\nguards = \"fired\"";
    decides_on_a_step_of_concern: "weight = \"supporting\"" => "weight = \"concern\"\ndecides = \"in\"";
    a_criterion_that_asks_nothing: "assess = \"No number settles it.\"\n" => "";
    a_criterion_with_steps_and_a_sentence: "title = \"Toxic\"" => "title = \"Toxic\"\nassess = \"No number settles it.\"";
    a_criterion_used_twice: "id = \"T\"" => "id = \"B\"";
    a_designation_named_like_a_criterion: "id = \"PBT\"" => "id = \"B\"";
    a_designation_used_twice: "id = \"any concern\"" => "id = \"PBT\"";
    a_designation_of_an_unknown_part: "all-of = [\"P\", \"B\", \"T\"]" => "all-of = [\"P\", \"BB\", \"T\"]";
    a_designation_of_ratings: "all-of = [\"P\", \"B\", \"T\"]" => "all-of = [\"P\", \"rating\", \"T\"]";
    a_designation_of_itself: "all-of = [\"P\", \"B\", \"T\"]" => "all-of = [\"P\", \"PBT\"]";
    designations_in_a_circle: "all-of = [\"P\", \"B\", \"T\"]" => "all-of = [\"P\", \"any concern\"]";
    a_designation_of_all_and_any: "any-of = [\"PBT\", \"effects\"]" => "any-of = [\"PBT\"]\nall-of = [\"P\"]";
    a_designation_without_parts: "any-of = [\"PBT\", \"effects\"]\n" => "";
    stated_by_no_code: "stated-by = [\"EUH440\"]" => "stated-by = [\"440\"]";
    a_temperature_alone: "half-life-activation-energy = \"65.4 kJ/mol\"\n" => "";
    an_energy_without_unit: "\"65.4 kJ/mol\"" => "65.4";
    a_content_over_everything: "mixture-limit = \"0.1 %\"" => "mixture-limit = \"110 %\"";
    a_cas_number_with_a_wrong_check_digit: "\"50-29-3\"" => "\"50-29-4\"";
    an_ec_number_with_a_wrong_check_digit: "\"200-024-3\"" => "\"200-024-4\"";
    a_list_without_numbers: "cas = [\"50-29-3\"]\nec = [\"200-024-3\"]\n" => "";
}

#[test]
fn an_empty_step() {
    let (head, _) = SOUND.split_once("[[criterion.step.test]]").unwrap();
    insta::assert_snapshot!(answer_to_file("house.toml", head.as_bytes()));
}

#[test]
fn a_file_without_head() {
    let (_, tail) = SOUND.split_once("[[criterion]]").unwrap();
    insta::assert_snapshot!(answer_to_file("house.toml", format!("[[criterion]]{tail}").as_bytes()));
}

#[test]
fn a_rulebook_without_criteria() {
    let (head, _) = SOUND.split_once("[[criterion]]").unwrap();
    insta::assert_snapshot!(answer_to_file("house.toml", head.as_bytes()));
}

#[test]
fn all_faults_are_found_at_once_and_in_the_order_of_the_file() {
    let text = SOUND
        .replacen("title = \"House rules\"", "title = 7", 1)
        .replacen("above = \"40 d\"", "above = 40", 1)
        .replacen("property = \"bcf\"", "property = \"bfc\"", 1)
        .replacen("\"50-29-3\"", "\"50-29-4\"", 1);
    insta::assert_snapshot!(answer_to_file("house.toml", text.as_bytes()));
}

#[test]
fn bytes_that_are_no_text() {
    let mut bytes = SOUND.as_bytes().to_vec();
    let place = SOUND.find("House rules").unwrap();
    bytes[place] = 0xE4;
    insta::assert_snapshot!(answer_to_file("house.toml", &bytes));
}

#[test]
fn a_file_that_is_not_there() {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join("none.toml");
    insta::assert_snapshot!(answer_to_paths(&folder, &[path]));
}

#[test]
fn a_folder_without_rulebooks() {
    let folder = tempfile::tempdir().unwrap();
    insta::assert_snapshot!(answer_to_paths(&folder, &[folder.path().to_owned()]));
}

#[test]
fn two_rulebooks_of_one_name() {
    let folder = tempfile::tempdir().unwrap();
    for name in ["first.toml", "second.toml"] {
        std::fs::write(folder.path().join(name), SOUND).unwrap();
    }
    insta::assert_snapshot!(answer_to_paths(&folder, &[folder.path().to_owned()]));
}

#[test]
fn faulty_cautions() {
    let text = r#"
[[caution]]
id = "siloxane"
sentence = "Estimates spread widely."
source = "common practice"
name-patterns = ["siloxane(", "silo\\w+"]
blocks = ["log-cow"]

[[caution]]
id = "siloxane"
sentence = "Again."
source = "common practice"
substance-types = ["silicone"]
blocks = "all"

[[caution]]
id = "never"
sentence = "Nothing raises it."
source = "common practice"
blocks = []
"#;
    insta::assert_snapshot!(answer_to_file("cautions.toml", text.as_bytes()));
}

#[test]
fn faulty_relations() {
    let text = r#"
[[relation]]
id = "line"
citation = "House data"
from = "log-kow"
to = "bcf"
coefficients = [-0.7, "0.85"]
at-least = 6
at-most = 1
sd = -0.5
checked = "sure"
class = "neutral"

[[relation]]
id = "line"
citation = "House data"
from = "log-kow"
to = "koc"
coefficients = []
at-least = 1
sd = 0.5
checked = "seen"
class = "neutral"

[[default-sd]]
property = "bcf"
sd = 0.3
source = "assumed"
"#;
    insta::assert_snapshot!(answer_to_file("relations.toml", text.as_bytes()));
}

#[test]
fn a_mark_at_the_start_of_the_file_is_no_fault() {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join("house.toml");
    std::fs::write(&path, format!("\u{feff}{SOUND}").replace('\n', "\r\n")).unwrap();
    assert_eq!(check_paths(&[path]).unwrap().len(), 1);
}

#[test]
fn colour_is_only_drawn_when_asked_for() {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join("house.toml");
    std::fs::write(&path, SOUND.replace("above = 4.5", "above = 4,5")).unwrap();
    let faults = check_paths(&[path]).unwrap_err();
    assert!(!faults.draw(Drawing::Plain).contains('\u{1b}'));
    assert!(faults.draw(Drawing::Coloured).contains('\u{1b}'));
    assert_eq!(faults.0[0].line(), Some(54));
}

/// A file cut anywhere, or with a line missing, is answered with faults or read: it never panics, and a fault always
/// can be drawn.
#[test]
fn a_damaged_file_is_always_answered() {
    let folder = tempfile::tempdir().unwrap();
    let (path, cautions) = (folder.path().join("house.toml"), folder.path().join("cautions.toml"));
    // The built-in cautions take long to read; one is enough here.
    let inorganic =
        "[[caution]]\nid = \"inorganic\"\nsentence = \"x\"\nsource = \"x\"\nionisable = true\nblocks = []";
    std::fs::write(&cautions, inorganic).unwrap();
    let cuts = SOUND.char_indices().map(|(end, _)| SOUND[..end].to_owned());
    let lines: Vec<&str> = SOUND.lines().collect();
    let gaps = (0..lines.len()).map(|gap| [&lines[..gap], &lines[gap + 1..]].concat().join("\n"));
    let doubled = (0..lines.len()).map(|line| [&lines[..=line], &lines[line..]].concat().join("\n"));
    for damaged in cuts.chain(gaps).chain(doubled) {
        std::fs::write(&path, &damaged).unwrap();
        if let Err(faults) = check_paths(&[cautions.clone(), path.clone()]) {
            assert!(!faults.0.is_empty(), "refused without a fault: {damaged}");
            assert!(!faults.to_string().is_empty());
        }
    }
}
