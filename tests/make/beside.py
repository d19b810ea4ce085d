"""Writes the example files that stand beside inventory.xlsx: supplier-list.xls, site-stock.ods and erp-export.csv.

    python tests/make/beside.py          checks the tables and writes the three files
    python tests/make/beside.py --check  checks the tables and that the files hold what the tables say

Needs LibreOffice (soffice) and the PyPI packages openpyxl, xlrd and odfpy. LibreOffice writes the xls and the ods, so
that they are what a spreadsheet program makes; it puts the time of the run into them, so their bytes differ from run to
run and their content does not. The csv has the same bytes.

The tables in tests/fixtures/beside hold the cells as text. The first column names the row of tests/fixtures/inventory.tsv
that a line takes its values from, or the kind of the line (header, units, heading, blank, total, title, page, note). The
second names the fields that were changed on purpose. Every number and hazard statement of the other property fields has
to stand in the row that is named, so that its source is that of tests/fixtures/inventory-sources.tsv.

In a table, a plain number with a decimal point becomes a number cell, a day (1980-05-07) a date cell, `\\n` a line break;
an apostrophe keeps a number a text. In the csv every cell is the text it is.
"""

import csv
import datetime
import pathlib
import re
import subprocess
import sys
import tempfile

import openpyxl
from openpyxl.styles import Alignment, Font, PatternFill
from openpyxl.utils import get_column_letter

ROOT = pathlib.Path(__file__).resolve().parents[2]
TABLES = ROOT / "tests/fixtures/beside"
OUTPUT = ROOT / "inputs-example"

# Cells of these fields name values of the source row; names, stocks and the like are the company's own.
FROM_SOURCE = {
    "cas-number", "ec-number", "log-kow", "water-solubility", "melting-point", "vapour-pressure", "log-koc", "koc", "bcf",
    "half-life-water", "half-life-marine-water", "half-life-sediment", "half-life-soil", "half-life-temperature",
    "ready-biodegradability", "acute-toxicity", "long-term-toxicity", "hazard-statements",
}
# In the inventory itself these are planted faults; the value meant is the one given here.
MEANT = {
    ("M-10115", "cas-number"): "110-82-7",
    ("M-10129", "cas-number"): "75-09-2",
    ("R-20292", "cas-number"): "80-05-7",
    ("R-20299", "cas-number"): "79-06-1",
    ("M-10192", "water-solubility"): "",
}


class Table:
    """A table of tests/fixtures: its field names and its lines."""

    def __init__(self, path):
        with open(path, encoding="utf-8", newline="") as file:
            lines = list(csv.reader(file, delimiter="\t", quoting=csv.QUOTE_NONE))
        self.fields, self.lines = lines[0], lines[1:]

    def cells(self, line):
        """The cells of a line as they go into the file: without the first two columns and the empty end."""
        cells = [text.replace("\\n", "\n") for text in line[2:]]
        while cells and not cells[-1]:
            cells.pop()
        return cells


def inventory():
    table = Table(ROOT / "tests/fixtures/inventory.tsv")
    place = table.fields.index("row-id")
    return {line[place]: dict(zip(table.fields, line)) for line in table.lines if line[place]}


def numbers(text):
    """The numbers and hazard statements of a cell, whatever its decimal separator; thousands are not grouped."""
    text = re.sub(r"(?<![\d.,])(\d{1,3})\.(\d{3})(?!\d)", r"\1\2", text.lstrip("'")) if text.startswith("'") else text
    text = text.replace(",", ".").replace("-", " ").replace("–", " ").replace("^", " ")
    return {match.rstrip("0").rstrip(".") if "." in match else match for match in re.findall(r"H\d{3}\w*|\d+(?:\.\d+)?", text)}


def check_values(name, table, source):
    """Every value stands in the row it is said to come from; says where one does not."""
    wrong = []
    for number, line in enumerate(table.lines, 2):
        ids = [row for row in line[0].split(";") if row in source]
        for field, text in zip(table.fields[2:], line[2:]):
            if not ids or field not in FROM_SOURCE or field in line[1].split():
                continue
            grouped = "'" + text if name == "erp-export" and field in ("koc", "bcf") else text
            known = {value for row in ids for value in numbers(MEANT.get((row, field), source[row][field]))}
            if strange := numbers(grouped) - known:
                wrong.append(f"{name}.tsv, line {number}, {field}: {text!r}, of which {sorted(strange)} is not in {line[0]}")
    return wrong


def typed(text):
    """The cell a text becomes."""
    if re.fullmatch(r"\d{4}-\d{2}-\d{2}", text):
        return datetime.date.fromisoformat(text)
    if re.fullmatch(r"-?\d+(\.\d+)?", text):
        return float(text) if "." in text else int(text)
    return text.removeprefix("'")


def fill_sheet(sheet, table, titles, date_format):
    """Writes titles and lines; gives the numbers of the rows that hold substances."""
    for row, title in enumerate(titles, 1):
        sheet.cell(row, 1, title).font = Font(bold=row == 1, size=13 if row == 1 else 10)
    sheet.merge_cells(start_row=1, end_row=1, start_column=1, end_column=8)
    substances = []
    for row, line in enumerate(table.lines, len(titles) + 1):
        kind = line[0]
        for column, text in enumerate(table.cells(line), 1):
            if not text:
                continue
            cell = sheet.cell(row, column, typed(text))
            if isinstance(cell.value, datetime.date):
                cell.number_format = date_format
            if kind in ("header", "units"):
                cell.font, cell.fill = Font(bold=True), PatternFill("solid", fgColor="D9E2E7")
                cell.alignment = Alignment(wrap_text=True, vertical="center")
            if kind in ("heading", "total", "note"):
                cell.font = Font(bold=kind != "note", italic=kind == "note")
        if kind == "heading":
            sheet.merge_cells(start_row=row, end_row=row, start_column=1, end_column=6)
        if kind == "total":
            column = table.fields.index("tonnes-per-year") - 1
            letter = get_column_letter(column)
            sheet.cell(row, column, f"=SUM({letter}{substances[0]}:{letter}{substances[-1]})").font = Font(bold=True)
        if kind not in ("header", "units", "heading", "total", "note", "blank"):
            substances.append(row)
    return substances


def look_up(book, name, lines):
    """A sheet that is no inventory."""
    sheet = book.create_sheet(name)
    for line in lines:
        sheet.append(line)


def supplier_list(table):
    book = openpyxl.Workbook()
    sheet = book.active
    sheet.title = "Produits"
    titles = [
        "Montvarne Résines SA : substances livrées à Grenwick & Aldermoor Surface Technologies",
        "Situation au 30/11/2026. Les valeurs sont données à titre indicatif.",
        None,
    ]
    fill_sheet(sheet, table, titles, "dd/mm/yyyy")
    sheet.freeze_panes = "E5"
    look_up(book, "Légende", [["Abréviation", "Signification"], ["MR", "référence interne"], ["t/an", "tonnes par an"]])
    return book


def site_stock(table):
    book = openpyxl.Workbook()
    sheet = book.active
    sheet.title = "Voorraad"
    titles = ["Grenwick & Aldermoor Surface Technologies: voorraad depot West", "Peildatum 30-11-2026"]
    fill_sheet(sheet, table, titles, "dd-mm-yyyy")
    unit = get_column_letter(table.fields.index("unit") - 1)
    sheet.column_dimensions[unit].hidden = True
    sheet.freeze_panes = "E5"
    look_up(book, "Eenheden", [["Eenheid", "Betekenis"], ["DR", "vat, 200 l"], ["IBC", "container, 1000 l"], ["CN", "bus, 25 l"],
                               ["SK", "zak, 25 kg"], ["GB", "glazen fles, 0,5 l"]])
    return book


def convert(book, stem, kind):
    """Lets LibreOffice write a workbook, which also works out its formulas."""
    with tempfile.TemporaryDirectory() as folder:
        source = pathlib.Path(folder, f"{stem}.xlsx")
        book.save(source)
        profile = f"-env:UserInstallation=file://{folder}/profile"
        command = ["soffice", profile, "--headless", "--convert-to", kind, "--outdir", folder, str(source)]
        subprocess.run(command, check=True, capture_output=True)
        suffix = kind.split(":")[0]
        (OUTPUT / f"{stem}.{suffix}").write_bytes(pathlib.Path(folder, f"{stem}.{suffix}").read_bytes())


def export_bytes(table):
    """The export: semicolons, Windows-1252, quotes where a cell needs them; lines of unequal length."""
    lines = []
    for line in table.lines:
        quoted = ['"' + cell.replace('"', '""') + '"' if re.search(r'[;"\n]', cell) else cell for cell in table.cells(line)]
        lines.append(";".join(quoted))
    return ("\r\n".join(lines) + "\r\n").encode("cp1252")


def read_xls(path):
    import xlrd

    book = xlrd.open_workbook(path)
    sheet = book.sheet_by_index(0)
    for row in range(sheet.nrows):
        cells = []
        for cell in sheet.row(row):
            is_day = cell.ctype == xlrd.XL_CELL_DATE
            cells.append(xlrd.xldate_as_datetime(cell.value, book.datemode).date() if is_day else cell.value)
        yield cells


def read_ods(path):
    from odf import teletype
    from odf.opendocument import load
    from odf.table import CoveredTableCell, Table as Sheet, TableCell, TableRow

    sheet = load(path).spreadsheet.getElementsByType(Sheet)[0]
    for row in sheet.getElementsByType(TableRow):
        cells = []
        for node in row.childNodes:
            if node.qname not in (TableCell().qname, CoveredTableCell().qname):
                continue
            kind, shown = node.getAttribute("valuetype"), "\n".join(teletype.extractText(part) for part in node.childNodes)
            value = {"float": lambda: float(node.getAttribute("value")),
                     "date": lambda: datetime.date.fromisoformat(node.getAttribute("datevalue")[:10])}.get(kind, lambda: shown)()
            cells += [value] * min(int(node.getAttribute("numbercolumnsrepeated") or 1), 100)
        for _ in range(min(int(row.getAttribute("numberrowsrepeated") or 1), 100)):
            yield cells


def compare(name, table, rows, titles):
    """What a file holds, read by other libraries, against its table."""
    wrong = []
    rows = list(rows)
    for place, line in enumerate(table.lines, titles):
        found = rows[place] if place < len(rows) else []
        for column, text in enumerate(table.cells(line)):
            value = found[column] if column < len(found) else ""
            if line[0] != "total" and text and value != typed(text):
                wrong.append(f"{name}, row {place + 1}, column {column + 1}: {value!r}, not {typed(text)!r}")
    return wrong


def main(arguments):
    source = inventory()
    names = ("supplier-list", "site-stock", "erp-export")
    tables = {name: Table(TABLES / f"{name}.tsv") for name in names}
    wrong = [fault for name in names for fault in check_values(name, tables[name], source)]
    if not wrong and "--check" not in arguments:
        convert(supplier_list(tables["supplier-list"]), "supplier-list", "xls:MS Excel 97")
        convert(site_stock(tables["site-stock"]), "site-stock", "ods")
        (OUTPUT / "erp-export.csv").write_bytes(export_bytes(tables["erp-export"]))
    if not wrong:
        wrong += compare("supplier-list.xls", tables["supplier-list"], read_xls(OUTPUT / "supplier-list.xls"), 3)
        wrong += compare("site-stock.ods", tables["site-stock"], read_ods(OUTPUT / "site-stock.ods"), 2)
        if (OUTPUT / "erp-export.csv").read_bytes() != export_bytes(tables["erp-export"]):
            wrong.append("erp-export.csv does not hold what its table says")
    sys.exit("\n".join(wrong) or 0)


if __name__ == "__main__":
    main(sys.argv[1:])
