//! What an xlsb workbook says it holds: its sheets in order, its shared texts, and from when it counts days.

use std::collections::{BTreeMap, BTreeSet};
use std::ops::ControlFlow;

use super::for_each_record;
use crate::fault::FileFault;
use crate::workbook::contents::{Contents, Keyed, Relation, SheetEntry, full_name, read_relations};
use crate::workbook::package::Package;
use crate::workbook::read::binary::bytes::{byte, long};
use crate::workbook::read::binary::rows::DayZero;
use crate::workbook::read::binary::texts::{SharedTexts, wide_text};
use crate::workbook::survey::Visibility;

/// The workbook as a whole.
pub(super) struct Workbook {
    /// What an annotated copy can be told of.
    pub(super) contents: Contents,
    pub(super) texts: SharedTexts,
    pub(super) day_zero: DayZero,
    /// The part with the formats.
    pub(super) styles: Option<String>,
}

/// Reads the workbook's own description of itself.
pub(super) fn read_workbook(package: &mut Package) -> Result<Workbook, FileFault> {
    let main = read_relations(package, "_rels/.rels", Keyed::ByType)?
        .into_iter()
        .find(|(kind, _)| kind.ends_with("/officeDocument"))
        .map_or_else(
            || "xl/workbook.bin".to_owned(),
            |(_, relation)| relation.target.trim_start_matches('/').to_owned(),
        );
    let (folder, file) = main.rsplit_once('/').map_or(("", main.as_str()), |(folder, file)| (folder, file));
    let folder = if folder.is_empty() { String::new() } else { format!("{folder}/") };
    let relations = read_relations(package, &format!("{folder}_rels/{file}.rels"), Keyed::ById)?;
    let part = |ending: &str| {
        let relation = relations.values().find(|relation| relation.kind.ends_with(ending))?;
        Some(full_name(&relation.target, &folder))
    };
    let mut workbook = Workbook {
        contents: Contents::default(),
        texts: SharedTexts::default(),
        day_zero: DayZero::In1900,
        styles: part("/styles"),
    };
    read_sheet_list(package, &main, &relations, &folder, &mut workbook)?;
    if let Some(texts) = part("/sharedStrings") {
        read_shared_texts(package, &texts, &mut workbook)?;
    }
    Ok(workbook)
}

/// A sheet as the workbook lists it.
struct Listed {
    name: String,
    relation: String,
    visibility: Visibility,
}

fn read_sheet_list(
    package: &mut Package,
    main: &str,
    relations: &BTreeMap<String, Relation>,
    folder: &str,
    workbook: &mut Workbook,
) -> Result<(), FileFault> {
    let mut listed = Vec::new();
    for_each_record(package, main, |kind, data| {
        match kind {
            0x0099 if byte(data, 0).unwrap_or(0) & 1 != 0 => workbook.day_zero = DayZero::In1904,
            0x009C => listed.push(listed_sheet(data).ok_or("its list of sheets is cut off")?),
            0x0027 => workbook.contents.defined_names += 1,
            _ => {}
        }
        Ok(ControlFlow::Continue(()))
    })?;
    let mut seen = BTreeSet::new();
    for Listed { name, relation, visibility } in listed {
        let Some(relation) = relations.get(&relation).filter(|_| !name.is_empty()) else {
            return Err(package.damaged(format!("it lists a sheet `{name}` without saying where it is")));
        };
        if !seen.insert(name.to_lowercase()) {
            return Err(package.damaged(format!("it has two sheets named `{name}`")));
        }
        if !relation.kind.ends_with("/worksheet") {
            workbook.contents.other_sheets.push(name);
            continue;
        }
        let part = full_name(&relation.target, folder);
        if !package.has(&part) {
            return Err(package.damaged(format!("the part `{part}` of sheet `{name}` is missing")));
        }
        workbook.contents.sheets.push(SheetEntry { name, visibility, part });
    }
    if workbook.contents.sheets.is_empty() {
        return Err(package.damaged("it has no worksheet"));
    }
    Ok(())
}

fn listed_sheet(data: &[u8]) -> Option<Listed> {
    let visibility = match long(data, 0)? {
        0 => Visibility::Visible,
        1 => Visibility::Hidden,
        _ => Visibility::VeryHidden,
    };
    let (mut relation, mut name) = (String::new(), String::new());
    // A module of macros may stand among the sheets without a part of its own; its length is then all ones.
    let end = if long(data, 8)? == u32::MAX { 12 } else { wide_text(data, 8, &mut relation)? };
    wide_text(data, end, &mut name)?;
    Some(Listed { name, relation, visibility })
}

fn read_shared_texts(package: &mut Package, part: &str, workbook: &mut Workbook) -> Result<(), FileFault> {
    for_each_record(package, part, |kind, data| {
        if kind == 0x0013 {
            let flags = byte(data, 0).unwrap_or(0);
            workbook.texts.add(|text| wide_text(data, 1, text)).ok_or("one of its texts is cut off")?;
            workbook.contents.mixed_texts += u64::from(flags & 1 != 0);
        }
        Ok(ControlFlow::Continue(()))
    })?;
    Ok(())
}
