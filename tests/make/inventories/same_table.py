"""One small table, written by every writer at hand to every kind of file it can write."""

import datetime
import tempfile
from pathlib import Path

import openpyxl
import pandas
import xlsxwriter
import xlwt
from odf.opendocument import OpenDocumentSpreadsheet
from odf.style import Style
from odf.number import DateStyle, Day, Month, Text, Year
from odf.table import Table, TableCell, TableRow
from odf.text import P
from pyxlsbwriter import XlsbWriter

import sheetjs
from common import KINDS, check_numbers, convert, settle

D = datetime.date
T = datetime.datetime
HEADER = ["Material", "Substance name", "CAS number", "log Kow", "Water solubility (mg/L)", "Half-life soil (d)", "Checked on",
          "Sampled at", "In use", "Check value", None, "Remarks"]
ROWS = [
    ["000101", "Phenol", "108-95-2", 1.47, 84000, 2, D(2024, 3, 15), T(2024, 3, 15, 13, 45), True, "#N/A", None, "plain"],
    ["000102", "Toluol – rein", "108-88-3", 2.73, 526, 7, D(1999, 12, 31), T(2024, 3, 15, 0, 0, 1), False, "#DIV/0!", None, "µg/L ≥ 0,5 ‰"],
    ["000103", "β-Hexachlorocyclohexane", "319-85-7", 3.78, 0.24, "> 120", D(2000, 2, 29), T(2024, 3, 15, 23, 59, 59), True, "#VALUE!", None, "αβγδ ± °C"],
    ["000104", "六六六", "608-73-1", 3.8, 7.3, "30–300", D(1900, 3, 1), T(1985, 6, 1, 6, 30), False, "#REF!", None, "不得使用"],
    ["000105", "トルエン", "108-88-3", -0.5, 0, 7.25, D(2038, 1, 19), T(2038, 1, 19, 3, 14, 7), True, "#NAME?", None, "半減期 ７日"],
    ["000106", "Толуол", "108-88-3", 0.1, 1e-9, 0.5, D(2024, 2, 29), T(2024, 2, 29, 12, 0), False, "#NUM!", None, "кириллица"],
    ["000107", "Acétate d'éthyle", "141-78-6", 0.73, 79000.5, None, D(2023, 1, 1), T(2023, 1, 1, 18, 0), True, 12, None, "l'été « chaud »"],
    ["000108", "Ethanol", "64-17-5", -0.35, 1000000000, "n.d.", D(2023, 1, 2), None, False, -3.5, None, "two\nlines"],
    ["000109", "Anthracen", "120-12-7", 4.5, 0.045, "210 d", D(2023, 1, 3), None, True, 0, None, "semi;colon, comma\ttab"],
    ["000110", "DDT", "50-29-3", 6.91, 0.0055, "2 - 15 a", D(2023, 1, 4), None, False, 1e300, None, 'she said "no"'],
    ["000111", "Lindane", "58-89-9", 3.72, 7.3, 1.23456789012345, D(2023, 1, 5), None, True, 1e-300, None, "TRUE"],
    ["000112", "Aldrin", "309-00-2", 6.5, 0.017, 550, D(2023, 1, 6), None, False, 123456789012, None, "1.50"],
    ["000113", "Dieldrin", "60-57-1", 5.4, 0.195, 1100, D(2023, 1, 7), None, True, 0.1, None, "2024-03-15"],
    ["000114", "Mirex", "2385-85-5", 6.89, 8.5e-05, 4380, D(2023, 1, 8), None, False, 1 / 3, None, "00123"],
    ["000115", "Endrin", "72-20-8", 5.2, 0.25, 5110, D(2023, 1, 9), None, True, 42, None, "=not a formula"],
    ["000116", "Hexachlorobenzene", "118-74-1", 5.73, 0.0062, 2000, D(2023, 1, 10), None, False, 99.5, None, "it's"],
    ["000117", "Chlordane", "57-74-9", 6.16, 0.056, 1200, D(2023, 1, 11), None, True, 7, None, "e\u0301 composed and é"],
    ["000118", "Heptachlor", "76-44-8", 6.1, 0.18, 250, D(2023, 1, 12), None, False, 8, None, "🧪 flask"],
    ["000119", "Endosulfan", "115-29-7", 3.83, 0.32, 50, D(2023, 1, 13), None, True, 9, None, "<b>&amp;</b>"],
    ["000120", "Atrazine", "1912-24-9", 2.5, 33, 75, None, None, False, None, None, "last"],
]
ERRORS = {"#N/A": "=NA()", "#DIV/0!": "=1/0", "#VALUE!": '="a"+1', "#REF!": "=INDEX(A1:A2,9)", "#NAME?": "=nonsense()", "#NUM!": "=SQRT(-1)"}



def is_error(value):
    return isinstance(value, str) and value in ERRORS


def with_openpyxl(path):
    book = openpyxl.Workbook()
    sheet = book.active
    sheet.title = "Table"
    for row in [HEADER, *ROWS]:
        sheet.append(row)
    # openpyxl takes a text with an equals sign for a formula.
    sheet["L16"].data_type = "s"
    book.save(path)
    settle(path)


def with_openpyxl_as_xlsm(path):
    """The xlsx with the content type of a workbook with macros, but none in it."""
    with_openpyxl(path)
    book = openpyxl.load_workbook(path, keep_vba=True)
    book["Table"]["L16"].data_type = "s"
    book.save(path)
    settle(path)


def with_xlsxwriter(path, format_of_booleans="General"):
    book = xlsxwriter.Workbook(path, {"default_date_format": "yyyy-mm-dd", "strings_to_formulas": False, "strings_to_urls": False})
    book.set_properties({"created": T(2025, 4, 1, 8)})
    times = book.add_format({"num_format": "yyyy-mm-dd hh:mm:ss"})
    booleans = book.add_format({"num_format": format_of_booleans})
    sheet = book.add_worksheet("Table")
    for index, row in enumerate([HEADER, *ROWS]):
        for column, value in enumerate(row):
            if is_error(value):
                sheet.write_formula(index, column, ERRORS[value], None, value)
            elif isinstance(value, T):
                sheet.write_datetime(index, column, value, times)
            elif isinstance(value, bool):
                sheet.write_boolean(index, column, value, booleans)
            elif value is not None:
                sheet.write(index, column, value)
    book.close()
    settle(path)


def frame():
    return pandas.DataFrame([[*row] for row in ROWS], columns=[name or "" for name in HEADER], dtype=object)


def with_pandas(path):
    frame().to_excel(path, sheet_name="Table", index=False, engine="openpyxl")
    # pandas hands texts on, and openpyxl takes one with an equals sign for a formula.
    settle(path)


def with_xlwt(path):
    book = xlwt.Workbook(encoding="utf-8")
    sheet = book.add_sheet("Table")
    days = xlwt.easyxf(num_format_str="YYYY-MM-DD")
    times = xlwt.easyxf(num_format_str="YYYY-MM-DD HH:MM:SS")
    for index, row in enumerate([HEADER, *ROWS]):
        for column, value in enumerate(row):
            if is_error(value):
                sheet.row(index).set_cell_error(column, sheetjs.CODES[value])
            elif isinstance(value, T):
                sheet.write(index, column, value, times)
            elif isinstance(value, D):
                sheet.write(index, column, value, days)
            elif value is not None:
                sheet.write(index, column, value)
    book.save(str(path))


def with_odfpy(path):
    document = OpenDocumentSpreadsheet()
    style = DateStyle(name="iso")
    for part in [Year(style="long"), Text(text="-"), Month(style="long"), Text(text="-"), Day(style="long")]:
        style.addElement(part)
    document.automaticstyles.addElement(style)
    days = Style(name="days", family="table-cell", datastylename="iso")
    document.automaticstyles.addElement(days)
    table = Table(name="Table")
    for row in [HEADER, *ROWS]:
        line = TableRow()
        for value in row:
            line.addElement(odf_cell(value, days))
        table.addElement(line)
    document.spreadsheet.addElement(table)
    document.save(str(path))
    settle(path)


def odf_cell(value, days):
    if value is None:
        return TableCell()
    if isinstance(value, bool):
        cell, shown = TableCell(valuetype="boolean", booleanvalue=str(value).lower()), str(value).upper()
    elif isinstance(value, (int, float)):
        cell, shown = TableCell(valuetype="float", value=repr(value)), str(value)
    elif isinstance(value, T):
        cell, shown = TableCell(valuetype="date", datevalue=value.isoformat(), stylename=days), value.isoformat(" ")
    elif isinstance(value, D):
        cell, shown = TableCell(valuetype="date", datevalue=value.isoformat(), stylename=days), value.isoformat()
    else:
        cell, shown = TableCell(valuetype="string"), value
    for paragraph in shown.split("\n"):
        cell.addElement(P(text=paragraph))
    return cell


def with_pyxlsbwriter(path):
    """This writer says of every sheet that it is one cell large, and has no cells for errors."""
    with XlsbWriter(str(path)) as book:
        book.add_sheet("Table")
        book.write_sheet([HEADER, *ROWS])
    settle(path)


CSV_OF_LIBREOFFICE = "csv:Text - txt - csv (StarCalc):59,34,76,1,,0,false,false,false"


def make():
    check_numbers(ROWS)
    with_openpyxl(KINDS / "openpyxl.xlsx")
    with_openpyxl_as_xlsm(KINDS / "openpyxl.xlsm")
    with_xlsxwriter(KINDS / "xlsxwriter.xlsx")
    with_pandas(KINDS / "pandas.xlsx")
    frame().to_csv(KINDS / "pandas.csv", index=False, encoding="utf-8", lineterminator="\n")
    with_xlwt(KINDS / "xlwt.xls")
    with_odfpy(KINDS / "odfpy.ods")
    with_pyxlsbwriter(KINDS / "pyxlsbwriter.xlsb")
    sheetjs.write(KINDS / "sheetjs.xlsb", "Table", [HEADER, *ROWS])
    sheetjs.write(KINDS / "sheetjs.xls", "Table", [HEADER, *ROWS])
    with tempfile.TemporaryDirectory() as folder:
        source = Path(folder) / "table.xlsx"
        with_xlsxwriter(source)
        formatted = Path(folder) / "formatted.xlsx"
        # Without the format LibreOffice would save the booleans as the numbers 1 and 0 in ods.
        with_xlsxwriter(formatted, "BOOLEAN")
        for kind in ["xlsx", "xlsm", "xls", "ods", CSV_OF_LIBREOFFICE]:
            name = kind.split(":")[0]
            convert(formatted if kind == "ods" else source, kind, KINDS / f"libreoffice.{name}")
            if name in ("xlsx", "xlsm", "ods"):
                settle(KINDS / f"libreoffice.{name}")


if __name__ == "__main__":
    make()
