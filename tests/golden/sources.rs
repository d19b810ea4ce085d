//! Every value of the example inventory has a source, so that nothing in it is made up unsaid.

use std::collections::BTreeMap;
use std::path::Path;

use kowledger::quantity::is_missing;

/// The lines of a table: each a map from heading to text.
fn lines_of(table: &str) -> Vec<BTreeMap<String, String>> {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/fixtures").join(table);
    let mut reader =
        csv::ReaderBuilder::new().delimiter(b'\t').quoting(false).from_path(path).expect("the table");
    reader.deserialize().map(|line| line.expect("a line")).collect()
}

/// Says of itself what it is, or is told in the reference column of its row.
const WITHOUT_SOURCE: [&str; 7] =
    ["sheet", "row-id", "name", "substance-type", "log-kow-method", "reference", "planted"];

#[test]
fn each_value_has_one_source_which_names_the_same_value() {
    let mut sources = BTreeMap::new();
    for line in lines_of("inventory-sources.tsv") {
        let place = (line["row-id"].clone(), line["field"].clone());
        assert!(["seen", "second-hand", "memory", "invented"].contains(&line["status"].as_str()), "{line:?}");
        assert!(sources.insert(place, line["value"].clone()).is_none(), "two sources: {line:?}");
    }
    for line in lines_of("inventory.tsv").iter().filter(|line| !line["row-id"].is_empty()) {
        let told = |field: &str| !WITHOUT_SOURCE.contains(&field);
        for (field, value) in line.iter().filter(|(field, value)| told(field) && !is_missing(value)) {
            let source = sources.remove(&(line["row-id"].clone(), field.clone()));
            // A look-up that failed is shown as `#N/A`, which is a word for missing as well.
            assert_eq!(source.as_deref().map(str::trim), Some(value.trim()), "{} {field}", line["row-id"]);
        }
    }
    sources.retain(|_, value| value != "#N/A");
    assert!(sources.is_empty(), "sources without a value: {sources:?}");
}
