//! What a sheet has besides cells, counted so that what is not carried over can be named.

use crate::fault::count;

/// What stands on a sheet besides its cells.
#[derive(Debug, Clone, Default, PartialEq, Eq)]
pub(in crate::workbook) struct Extras {
    pub(in crate::workbook) hidden_rows: usize,
    pub(in crate::workbook) row_heights: usize,
    pub(in crate::workbook) merges: usize,
    pub(in crate::workbook) links: usize,
    pub(in crate::workbook) filters: usize,
    pub(in crate::workbook) conditional_formats: usize,
    pub(in crate::workbook) cell_checks: usize,
    pub(in crate::workbook) protections: usize,
    pub(in crate::workbook) tables: usize,
    pub(in crate::workbook) drawings: usize,
    pub(in crate::workbook) notes: usize,
    pub(in crate::workbook) objects: usize,
    pub(in crate::workbook) sparklines: usize,
    pub(in crate::workbook) page_breaks: usize,
}

impl Extras {
    /// Counts an element that stands after the rows, by its local name.
    pub(in crate::workbook) fn note(&mut self, element: &str) {
        let counter = match element {
            "mergeCell" => &mut self.merges,
            "hyperlink" => &mut self.links,
            "autoFilter" => &mut self.filters,
            "conditionalFormatting" => &mut self.conditional_formats,
            "dataValidation" => &mut self.cell_checks,
            "sheetProtection" => &mut self.protections,
            "tablePart" => &mut self.tables,
            "drawing" => &mut self.drawings,
            "legacyDrawing" => &mut self.notes,
            "oleObject" | "control" => &mut self.objects,
            "sparkline" => &mut self.sparklines,
            "brk" => &mut self.page_breaks,
            _ => return,
        };
        *counter += 1;
    }

    /// Each thing in words, such as `2 merged ranges`.
    pub(super) fn in_words(&self) -> Vec<String> {
        let counted = [
            (self.hidden_rows, "hidden row (shown in the output)", "hidden rows (shown in the output)"),
            (self.row_heights, "row height", "row heights"),
            (self.merges, "merged range", "merged ranges"),
            (self.links, "link", "links"),
            (self.filters, "filter", "filters"),
            (self.conditional_formats, "conditional format", "conditional formats"),
            (self.cell_checks, "data validation", "data validations"),
            (self.tables, "table frame (its cells are)", "table frames (their cells are)"),
            (self.objects, "embedded object or control", "embedded objects or controls"),
            (self.sparklines, "sparkline", "sparklines"),
            (self.page_breaks, "page break", "page breaks"),
        ];
        let mut words: Vec<String> = counted
            .into_iter()
            .filter(|(number, ..)| *number > 0)
            .map(|(number, singular, plural)| count(number, singular, plural))
            .collect();
        let named = [
            (self.protections, "the sheet's protection"),
            (self.drawings, "charts, images or shapes"),
            (self.notes, "notes or comments"),
        ];
        words.extend(named.iter().filter(|(number, _)| *number > 0).map(|(_, name)| (*name).to_owned()));
        words
    }
}

impl super::SheetSurvey {
    /// What of this sheet is not carried over, in sentences.
    pub(in crate::workbook) fn not_carried(&self) -> Vec<String> {
        let mut sentences = Vec::new();
        let words = self.extras.in_words();
        if !words.is_empty() {
            sentences.push(format!("Sheet `{}`, not carried over: {}.", self.name, words.join(", ")));
        }
        if self.formulas > 0 {
            sentences.push(format!(
                "Sheet `{}`: {} written as the last stored result.",
                self.name,
                count(self.formulas, "formula is", "formulas are")
            ));
        }
        if self.formulas_without_result > 0 {
            sentences.push(format!(
                "Sheet `{}`: {} no stored result and read as empty; open and save the workbook in a spreadsheet \
                 program to fill them.",
                self.name,
                count(self.formulas_without_result, "formula has", "formulas have")
            ));
        }
        if self.error_values > 0 {
            sentences.push(format!(
                "Sheet `{}`: {} written as an error again where xlsx knows it, else as text.",
                self.name,
                count(self.error_values, "error value is", "error values are")
            ));
        }
        sentences
    }
}
