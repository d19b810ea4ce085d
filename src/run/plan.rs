//! What is known before the first row is judged: which sheets are screened and what their columns hold.

use std::path::Path;
use std::sync::Arc;

use crate::columns::{ColumnOverride, ColumnWords, Recognised, recognise};
use crate::fault::{FileFault, Refusal, nearest};
use crate::report::{AddedColumns, RECORD_MARK, RECORD_SHEET, ReasoningMode, added_columns};
use crate::rules::RuleSet;
use crate::run::widths::fitted_widths;
use crate::run::{ReasoningChoice, ScreenSettings};
use crate::substance::RowReader;
use crate::workbook::{CellContent, Inventory, Row, Visibility, open_inventory};

/// Rows at the top of a sheet in which a header is looked for and decimal styles are sampled.
const ROWS_LOOKED_AT: usize = 200;
/// Above this number of lines the Reasoning sheet holds only what is of concern.
const LINES_IN_FULL: usize = 200_000;

/// What each sheet is.
#[derive(Debug)]
pub(crate) struct Plan {
    /// The sheets, in order.
    pub(crate) sheets: Vec<SheetPlan>,
    /// What headers are recognised by.
    pub(crate) words: ColumnWords,
    /// Which lines the Reasoning sheet holds.
    pub(crate) reasoning: ReasoningMode,
}

/// One sheet.
#[derive(Debug)]
pub(crate) struct SheetPlan {
    /// Its place in the inventory.
    pub(crate) index: usize,
    /// Its name.
    pub(crate) name: Arc<str>,
    /// Whether its tab is shown.
    pub(crate) visibility: Visibility,
    /// Widths of its columns, in characters, where the file gives none.
    pub(crate) widths: Vec<(u16, f64)>,
    /// How it is screened; none where it is only copied.
    pub(crate) screened: Option<Screened>,
    /// Why it is only copied.
    pub(crate) copied_because: String,
}

impl SheetPlan {
    /// Whether a row is of a header whose texts are broken over lines, because the widths are ours.
    pub(crate) fn wraps(&self, row: u32) -> bool {
        let header = self.screened.as_ref().map(|screened| &screened.recognised);
        !self.widths.is_empty()
            && header.is_some_and(|header| (header.header_top..=header.header_row).contains(&row))
    }

    /// Whether its tab is not shown.
    pub(crate) fn hidden(&self) -> bool {
        match self.visibility {
            Visibility::Visible => false,
            Visibility::Hidden | Visibility::VeryHidden => true,
        }
    }
}

/// How a sheet is screened.
#[derive(Debug)]
pub(crate) struct Screened {
    /// Its header and columns.
    pub(crate) recognised: Recognised,
    /// Reads its rows.
    pub(crate) reader: RowReader,
    /// The added columns.
    pub(crate) added: AddedColumns,
    /// The first added column.
    pub(crate) first_added: u16,
    /// How many fields the header has, where lines are cut into fields.
    pub(crate) header_fields: Option<usize>,
}

/// A sheet and what was recognised on it, for `kowledger columns`.
#[derive(Debug, Clone, PartialEq)]
pub struct RecognisedSheet {
    /// The sheet's name.
    pub name: String,
    /// Its header and columns, if it has any that are known.
    pub recognised: Option<Recognised>,
    /// How the file was read where it does not say so itself, in sentences.
    pub how_read: Vec<String>,
}

/// What the columns of an inventory hold, and why.
pub fn recognise_columns(
    inventory: &Path,
    overrides: &[ColumnOverride],
) -> Result<Vec<RecognisedSheet>, Refusal> {
    let mut inventory = open_inventory(inventory)?;
    let words = ColumnWords::built_in().map_err(Refusal::Usage)?;
    let mut sheets = Vec::new();
    let names: Vec<Arc<str>> = inventory.sheets().iter().map(|sheet| sheet.name.clone()).collect();
    for (index, name) in names.iter().enumerate() {
        let first_rows = inventory.first_rows(index, ROWS_LOOKED_AT)?;
        let mut recognised = recognise(name, &first_rows, &words, overrides);
        if let Some(recognised) = &mut recognised {
            recognised.remark_on_second_header(name, &first_rows, &words);
        }
        sheets.push(RecognisedSheet {
            name: name.to_string(),
            recognised,
            how_read: inventory.how_read().to_vec(),
        });
    }
    let recognised: Vec<&Recognised> =
        sheets.iter().filter_map(|sheet: &RecognisedSheet| sheet.recognised.as_ref()).collect();
    if !recognised.is_empty() {
        refuse_idle_overrides(overrides, &recognised)?;
    }
    Ok(sheets)
}

impl Plan {
    pub(crate) fn new(
        inventory: &mut Inventory,
        rules: &RuleSet,
        settings: &ScreenSettings,
    ) -> Result<Self, Refusal> {
        refuse_unknown_sheets(inventory, settings)?;
        refuse_own_output(inventory, settings)?;
        let words = ColumnWords::built_in().map_err(Refusal::Usage)?;
        let mut sheets = Vec::new();
        let mut lines = 0;
        let lines_a_row: usize = rules.rulebooks.iter().map(|rulebook| rulebook.criteria.len()).sum();
        let surveys = inventory.sheets().to_vec();
        let formats: Vec<_> = inventory.number_formats().collect();
        for (index, survey) in surveys.iter().enumerate() {
            let wanted =
                settings.sheets.is_empty() || settings.sheets.iter().any(|name| **name == *survey.name);
            let mut sheet = SheetPlan {
                index,
                name: survey.name.clone(),
                visibility: survey.visibility,
                widths: Vec::new(),
                screened: None,
                copied_because: "not among the sheets named with --sheet".to_owned(),
            };
            if wanted {
                let first_rows = inventory.first_rows(index, ROWS_LOOKED_AT)?;
                match recognise(&survey.name, &first_rows, &words, &settings.columns) {
                    Some(recognised) => {
                        let mut taken = headers(&first_rows, recognised.header_row);
                        // Of a header of two rows, the names stand in the upper one.
                        taken.extend(recognised.headers().map(str::to_owned));
                        let added = added_columns(rules, &taken);
                        let first_added = survey.used_columns;
                        refuse_overwide(&survey.name, first_added, added.headers.len())?;
                        let reader = RowReader::new(survey.name.clone(), &recognised, settings.unstated)
                            .with_number_formats(formats.iter().cloned())
                            .with_merges(survey.merges.clone());
                        let header_fields = fields_of_header(inventory, recognised.header_row);
                        sheet.screened =
                            Some(Screened { recognised, reader, added, first_added, header_fields });
                        lines += usize::try_from(survey.last_row)
                            .unwrap_or(usize::MAX)
                            .saturating_mul(lines_a_row);
                    }
                    None => NO_HEADER.clone_into(&mut sheet.copied_because),
                }
            }
            if inventory.gives_no_widths(index) {
                let recognised = sheet.screened.as_ref().map(|screened| &screened.recognised);
                sheet.widths = fitted_widths(&inventory.first_rows(index, ROWS_LOOKED_AT)?, recognised);
            }
            sheets.push(sheet);
        }
        if sheets.iter().all(|sheet| sheet.screened.is_none()) {
            return Err(FileFault::NoHeader {
                path: settings.inventory.display().to_string(),
                how_read: inventory.how_read().to_vec(),
                sheets: sheets.iter().map(|sheet| sheet.name.to_string()).collect(),
            }
            .into());
        }
        let recognised: Vec<&Recognised> = sheets
            .iter()
            .filter_map(|sheet: &SheetPlan| Some(&sheet.screened.as_ref()?.recognised))
            .collect();
        refuse_idle_overrides(&settings.columns, &recognised)?;
        let reasoning = match settings.reasoning {
            ReasoningChoice::Always(mode) => mode,
            ReasoningChoice::Auto if lines <= LINES_IN_FULL => ReasoningMode::All,
            ReasoningChoice::Auto => ReasoningMode::Concern,
        };
        Ok(Self { sheets, words, reasoning })
    }
}

/// Of a header of two rows, the lower one may have fewer fields.
fn fields_of_header(inventory: &Inventory, header_row: u32) -> Option<usize> {
    let above = header_row.checked_sub(1).and_then(|row| inventory.fields_in_row(row));
    inventory.fields_in_row(header_row).max(above)
}

/// A `--column` that speaks of no column there is would be obeyed by doing nothing.
fn refuse_idle_overrides(overrides: &[ColumnOverride], sheets: &[&Recognised]) -> Result<(), Refusal> {
    for told in overrides {
        if !sheets.iter().any(|sheet| sheet.has_column_of(told)) {
            let headers = sheets.iter().flat_map(|sheet| sheet.headers());
            let hint = nearest(&told.header, headers)
                .map_or(String::new(), |header| format!(" Did you mean `{header}`?"));
            return Err(Refusal::Usage(format!(
                "--column: no sheet has a column with the header `{}`; write the header as it stands in the sheet \
                 (`kowledger columns` lists them).{hint}",
                told.header
            )));
        }
    }
    Ok(())
}

const NO_HEADER: &str = "no header was recognised within the first 30 rows that hold anything: a column for a CAS number, EC number or structure, or a name beside another known column";

fn headers(first_rows: &[Row], header_row: u32) -> Vec<String> {
    first_rows
        .iter()
        .filter(|row| row.index == header_row)
        .flat_map(|row| &row.cells)
        .filter_map(|cell| match &cell.content {
            CellContent::Text(text) => Some(text.clone()),
            CellContent::Empty
            | CellContent::Number(_)
            | CellContent::Boolean(_)
            | CellContent::DateTime(_)
            | CellContent::Error(_) => None,
        })
        .collect()
}

fn refuse_unknown_sheets(inventory: &Inventory, settings: &ScreenSettings) -> Result<(), Refusal> {
    let names: Vec<&str> = inventory.sheets().iter().map(|sheet| &*sheet.name).collect();
    for wanted in &settings.sheets {
        if !names.contains(&wanted.as_str()) {
            let hint = nearest(wanted, names.iter().copied())
                .map_or(String::new(), |name| format!(" Did you mean `{name}`?"));
            return Err(Refusal::Usage(format!(
                "--sheet {wanted}: the inventory has no sheet of that name; it has {}.{hint}",
                names.join(", ")
            )));
        }
    }
    Ok(())
}

/// An output fed in again is recognised by its Record and by nothing else. Its added columns and sheets are no inventory.
fn refuse_own_output(inventory: &mut Inventory, settings: &ScreenSettings) -> Result<(), Refusal> {
    let record = inventory
        .sheets()
        .iter()
        // Saved in another format it may be only hidden.
        .position(|sheet| sheet.visibility != Visibility::Visible && &*sheet.name == RECORD_SHEET);
    let Some(record) = record else {
        return Ok(());
    };
    let first = inventory.first_rows(record, 1)?;
    let is_ours = first.first().and_then(|row| row.cell(0)).is_some_and(|cell| match &cell.content {
        CellContent::Text(text) => text == RECORD_MARK,
        CellContent::Empty
        | CellContent::Number(_)
        | CellContent::Boolean(_)
        | CellContent::DateTime(_)
        | CellContent::Error(_) => false,
    });
    if is_ours {
        return Err(FileFault::AlreadyScreened { path: settings.inventory.display().to_string() }.into());
    }
    Ok(())
}

/// A sheet has 16,384 columns.
const COLUMNS_A_SHEET: usize = 16_384;

fn refuse_overwide(sheet: &str, first_added: u16, added: usize) -> Result<(), Refusal> {
    if usize::from(first_added) + added <= COLUMNS_A_SHEET {
        return Ok(());
    }
    Err(FileFault::NoRoom { sheet: sheet.to_owned(), used: usize::from(first_added), needed: added }.into())
}
