//! What a workbook says it holds: its sheets in order, its shared texts and formats, and the parts that cannot be
//! carried over. Checks what the reading library takes on trust. It reads no sheet.

use std::collections::BTreeMap;

use quick_xml::XmlVersion;
use quick_xml::events::Event;

use crate::fault::{FileFault, FileKind};

use super::guard;
use super::package::{Found, Package, attribute};
use super::survey::Visibility;

/// More formats, fonts, fills and borders than this no workbook needs; spreadsheet programs stop at 65,490 cell formats.
const MOST_STYLE_RECORDS: u64 = 500_000;

/// The fewest bytes a shared text can take: `<si/>`.
const SMALLEST_SHARED_TEXT: u64 = 5;

/// What a workbook says it holds.
#[derive(Debug, Default)]
pub(super) struct Contents {
    /// The worksheets in the order of their tabs.
    pub(super) sheets: Vec<SheetEntry>,
    /// How many shared texts there are.
    pub(super) shared_texts: u64,
    /// How many of them change their font within the text.
    pub(super) mixed_texts: u64,
    /// Sheets that are no worksheets, by name.
    pub(super) other_sheets: Vec<String>,
    /// How many names the workbook defines for cells and formulas.
    pub(super) defined_names: usize,
}

/// A worksheet and the part it is stored in.
#[derive(Debug)]
pub(super) struct SheetEntry {
    pub(super) name: String,
    pub(super) visibility: Visibility,
    pub(super) part: String,
}

/// What a part refers to.
pub(super) struct Relation {
    pub(super) kind: String,
    pub(super) target: String,
}

/// Reads the workbook's own description of itself.
pub(super) fn read_contents(package: &mut Package) -> Result<Contents, FileFault> {
    let main = main_part(package)?;
    let (folder, file) = main.rsplit_once('/').map_or(("", main.as_str()), |(folder, file)| (folder, file));
    let folder = if folder.is_empty() { String::new() } else { format!("{folder}/") };
    let relations = read_relations(package, &format!("{folder}_rels/{file}.rels"), Keyed::ById)?;
    refuse_unusual_places(package, &relations, &folder)?;
    let mut contents = Contents::default();
    read_sheet_list(package, &main, &relations, &folder, &mut contents)?;
    if contents.sheets.is_empty() {
        return Err(package.damaged("it has no worksheet"));
    }
    read_shared_texts(package, &format!("{folder}sharedStrings.xml"), &mut contents)?;
    count_style_records(package, &format!("{folder}styles.xml"))?;
    Ok(contents)
}

/// The part that describes the workbook; tells what else the container is if there is none.
fn main_part(package: &mut Package) -> Result<String, FileFault> {
    let relations = read_relations(package, "_rels/.rels", Keyed::ByType)?;
    let main = relations
        .iter()
        .find(|(kind, _)| kind.ends_with("/officeDocument"))
        .map(|(_, relation)| relation.target.trim_start_matches('/').to_owned());
    match main {
        Some(main)
            if package.has(&main) && main.to_ascii_lowercase().ends_with(".xml") && !is_document(&main) =>
        {
            Ok(main)
        }
        Some(main) if !package.has(&main) => {
            Err(package.damaged(format!("its main part `{main}` is missing")))
        }
        Some(_) | None => {
            let found = guard::kind_of_package(package);
            Err(match found {
                FileKind::Archive if package.has("xl/workbook.xml") => {
                    package.damaged("it does not say which part is the workbook")
                }
                found => FileFault::AnotherKind { path: package.path.clone(), found },
            })
        }
    }
}

fn is_document(main: &str) -> bool {
    main.starts_with("word/") || main.starts_with("ppt/")
}

/// What the relations of a part are found by.
#[derive(Clone, Copy)]
pub(super) enum Keyed {
    ById,
    ByType,
}

/// Reads what a part refers to.
pub(super) fn read_relations(
    package: &mut Package,
    part: &str,
    keyed: Keyed,
) -> Result<BTreeMap<String, Relation>, FileFault> {
    let mut relations = BTreeMap::new();
    package.read_xml(part, |event| {
        if let Event::Start(element) = event
            && element.local_name().as_ref() == "Relationship"
        {
            let kind = attribute(element, "Type").unwrap_or_default();
            let key = match keyed {
                Keyed::ById => attribute(element, "Id").unwrap_or_default(),
                Keyed::ByType => kind.clone(),
            };
            let target = attribute(element, "Target").unwrap_or_default();
            relations.insert(key, Relation { kind, target });
        }
        Ok(())
    })?;
    Ok(relations)
}

/// The reading library looks for texts and formats under their usual names only; elsewhere they would be lost silently.
fn refuse_unusual_places(
    package: &Package,
    relations: &BTreeMap<String, Relation>,
    folder: &str,
) -> Result<(), FileFault> {
    for (ending, usual) in [("/sharedStrings", "sharedStrings.xml"), ("/styles", "styles.xml")] {
        for relation in relations.values().filter(|relation| relation.kind.ends_with(ending)) {
            if !full_name(&relation.target, folder).eq_ignore_ascii_case(&format!("{folder}{usual}")) {
                return Err(package.damaged(format!(
                    "its part `{}` stands where no spreadsheet program puts it",
                    relation.target
                )));
            }
        }
    }
    Ok(())
}

/// The full name of a part that is named from a folder.
pub(super) fn full_name(target: &str, folder: &str) -> String {
    target.strip_prefix('/').map_or_else(|| format!("{folder}{target}"), ToOwned::to_owned)
}

fn read_sheet_list(
    package: &mut Package,
    main: &str,
    relations: &BTreeMap<String, Relation>,
    folder: &str,
    contents: &mut Contents,
) -> Result<(), FileFault> {
    let mut listed = Vec::new();
    package.read_xml(main, |event| {
        if let Event::Start(element) = event {
            match element.local_name().as_ref() {
                "sheet" => {
                    let name = element
                        .attributes()
                        .filter_map(Result::ok)
                        .find(|attribute| attribute.key.as_ref() == "name")
                        .and_then(|attribute| attribute.normalized_value(XmlVersion::Implicit1_0).ok())
                        .map(std::borrow::Cow::into_owned);
                    listed.push((name, attribute(element, "id"), attribute(element, "state")));
                }
                "definedName" => contents.defined_names += 1,
                _ => {}
            }
        }
        Ok(())
    })?;
    let mut seen = Vec::new();
    for (name, id, state) in listed {
        let name = name.unwrap_or_default();
        let relation = id.and_then(|id| relations.get(&id));
        let Some(relation) = relation.filter(|_| !name.is_empty()) else {
            return Err(package.damaged(format!("it lists a sheet `{name}` without saying where it is")));
        };
        if seen.contains(&name.to_lowercase()) {
            return Err(package.damaged(format!("it has two sheets named `{name}`")));
        }
        seen.push(name.to_lowercase());
        if !relation.kind.ends_with("/worksheet") {
            contents.other_sheets.push(name);
            continue;
        }
        let part = full_name(&relation.target, folder);
        if !package.has(&part) {
            return Err(package.damaged(format!("the part `{part}` of sheet `{name}` is missing")));
        }
        let visibility = match state.as_deref() {
            Some("hidden") => Visibility::Hidden,
            Some("veryHidden") => Visibility::VeryHidden,
            _ => Visibility::Visible,
        };
        contents.sheets.push(SheetEntry { name, visibility, part });
    }
    Ok(())
}

/// Counts the shared texts. The reading library reserves room for as many as the part claims before it reads one.
fn read_shared_texts(package: &mut Package, part: &str, contents: &mut Contents) -> Result<(), FileFault> {
    let mut claimed = 0_u64;
    let mut bytes = 0_u64;
    let mut runs = 0_u64;
    let path = package.path.clone();
    let found = package.read_xml(part, |event| {
        bytes = bytes.saturating_add(u64::try_from(event.len()).unwrap_or(u64::MAX));
        if let Event::Start(element) = event {
            match element.local_name().as_ref() {
                // How often texts are used (`count`) may exceed their number, and nothing is reserved for it.
                "sst" => {
                    claimed =
                        attribute(element, "uniqueCount").and_then(|number| number.parse().ok()).unwrap_or(0);
                }
                "si" => {
                    contents.shared_texts += 1;
                    runs = 0;
                }
                "r" => {
                    runs += 1;
                    if runs == 2 {
                        contents.mixed_texts += 1;
                    }
                }
                _ => {}
            }
        }
        Ok(())
    })?;
    let possible = bytes / SMALLEST_SHARED_TEXT;
    if found == Found::Yes && claimed > possible.max(contents.shared_texts) {
        return Err(FileFault::Damaged {
            path,
            what: format!("it claims {claimed} different texts but stores {}", contents.shared_texts),
        });
    }
    Ok(())
}

fn count_style_records(package: &mut Package, part: &str) -> Result<(), FileFault> {
    let mut records = 0_u64;
    let path = package.path.clone();
    package.read_xml(part, |event| {
        if let Event::Start(element) = event
            && matches!(element.local_name().as_ref(), "xf" | "font" | "fill" | "border" | "numFmt")
        {
            records += 1;
            if records > MOST_STYLE_RECORDS {
                return Err(FileFault::TooLarge {
                    path: path.clone(),
                    part: "its list of cell formats".to_owned(),
                    found: format!("more than {MOST_STYLE_RECORDS} entries"),
                    limit: format!("{MOST_STYLE_RECORDS} entries"),
                });
            }
        }
        Ok(())
    })?;
    Ok(())
}
