"""Makes the small xls and xlsb workbooks under tests/fixtures/workbooks.

Needs the Python packages xlwt, openpyxl and pyxlsbwriter, LibreOffice (`soffice`), and node with the npm package xlsx on its
NODE_PATH. What each workbook holds is written down again, by hand, in the tests that read it.

    python3 tests/make/workbooks_binary.py
"""

import datetime
import pathlib
import subprocess
import tempfile

import openpyxl
import pyxlsbwriter
import xlwt
from openpyxl.chart import BarChart, Reference
from openpyxl.comments import Comment
from openpyxl.styles import Alignment, Border, Font, PatternFill, Side

FOLDER = pathlib.Path(__file__).resolve().parent.parent / "fixtures" / "workbooks"
# Longer than a record, and so stored in several; its width changes on the way.
LONG = "x" * 9000 + "ä" * 9000 + "日" * 9000


def style(number_format):
    found = xlwt.XFStyle()
    found.num_format_str = number_format
    return found


def kinds_of_cells_xls():
    book = xlwt.Workbook()
    sheet = book.add_sheet("Cells")
    day = datetime.datetime(2026, 12, 1)
    rows = [
        ("Kind", "Value", None),
        ("text", "Müller & 日本 <x>", None),
        ("number", 4.5, None),
        ("whole number", 12000, None),
        ("negative", -6.91, None),
        ("large", 1.2e300, None),
        ("date", day, "yyyy-mm-dd"),
        ("date and time", day.replace(hour=6), "dd.mm.yyyy hh:mm"),
        ("duration", 1.5, "[h]:mm"),
        ("percent", 0.25, "0.0%"),
        ("boolean", True, None),
        ("error", 42, "error"),  # the code of #N/A
        ("formula", xlwt.Formula("1+1"), None),
        ("apostrophe", "'6.91", None),
        ("number in text", "6,91", None),
        ("long", LONG, None),
    ]
    for index, (kind, value, number_format) in enumerate(rows):
        sheet.write(index, 0, kind)
        if number_format == "error":
            sheet.row(index).set_cell_error(1, value)
        elif number_format:
            sheet.write(index, 1, value, style(number_format))
        else:
            sheet.write(index, 1, value)
    bold = xlwt.easyfont("bold on")
    sheet.write(16, 0, "two fonts")
    sheet.write_rich_text(16, 1, [("log ", bold), "Kow"])
    sheet.write(19, 0, "after two empty rows")
    sheet.write(19, 255, "last column")
    layout = book.add_sheet("Layout")
    layout.set_panes_frozen(True)
    layout.set_horz_split_pos(2)
    layout.set_vert_split_pos(1)
    layout.col(0).width = 20 * 256
    layout.col(2).hidden = True
    for row in range(4):
        layout.row(row).set_cell_text(0, f"row {row + 1}")
        layout.row(row).set_cell_number(2, row)
    layout.write_merge(0, 0, 3, 5, "merged")
    layout.row(3).hidden = True
    for name, visibility in [("Hidden", 1), ("Very hidden", 2)]:
        other = book.add_sheet(name)
        other.write(0, 0, name)
        other.visibility = visibility
    book.save(str(FOLDER / "kinds-of-cells.xls"))


def from_1904_xls():
    book = xlwt.Workbook()
    book.dates_1904 = True
    sheet = book.add_sheet("Dates")
    sheet.write(0, 0, datetime.datetime(2026, 12, 1), style("yyyy-mm-dd"))
    sheet.write(0, 1, 1.5, style("[h]:mm:ss"))
    sheet.write(0, 2, 1000)
    book.save(str(FOLDER / "from-1904.xls"))


def computed_xls():
    book = openpyxl.Workbook()
    sheet = book.active
    sheet.title = "Computed"
    formulas = ["=1+1.5", '="a"&"b"', '=IF(1=1,"","x")', "=1=1", "=1/0", "=DATE(2026,12,1)", "=SUM(A1,A1)"]
    for index, formula in enumerate(formulas):
        sheet.cell(index + 1, 1, formula)
        sheet.cell(index + 1, 2, formula[1:])
    sheet["A6"].number_format = "yyyy-mm-dd"
    head = sheet["B1"]
    head.font = Font(name="Arial", size=14, bold=True, italic=True, underline="single", color="FF0000FF")
    head.fill = PatternFill("solid", fgColor="FFFFFF00")
    head.border = Border(bottom=Side("double", color="FFFF0000"), left=Side("thin"))
    head.alignment = Alignment(wrap_text=True, horizontal="center", vertical="top", text_rotation=45)
    sheet.column_dimensions["B"].width = 30
    sheet["B2"].comment = Comment("a note", "someone")
    sheet["B3"].hyperlink = "https://example.org/"
    sheet.merge_cells("D1:E2")
    chart = BarChart()
    chart.add_data(Reference(sheet, min_col=1, min_row=1, max_row=2))
    sheet.add_chart(chart, "G2")
    with tempfile.TemporaryDirectory() as folder:
        source = pathlib.Path(folder) / "computed.xlsx"
        book.save(source)
        convert(source, FOLDER)


# A list as someone might send it: the same in three kinds of file.
LIST = [
    ["Substances of the colour laboratory", None, None, None, None, None, None, None],
    ["Name", "CAS No.", "log Kow", "Half-life soil (d)", "BCF", "Molar mass", "Last reviewed", "Margin"],
    ["DDT", "50-29-3", 6.91, 3800, 12000, 354.49, datetime.date(2026, 3, 1), "=C3-4.5"],
    ["Phenol", "108-95-2", 1.46, 4, 17.5, 94.11, datetime.date(2025, 12, 24), "=C4-4.5"],
    ["Lindane", "58-89-9", "3,7", "> 120", 1400, 290.83, None, None],
    ["Benzene", "71-43-2", 2.13, None, None, 78.11, datetime.date(2024, 2, 29), "=C6-4.5"],
    [None] * 8,
    ["Hexachlorobenzene", "118-74-1", "5.5 - 5.9", "2000-3000", 20000, 284.78, None, None],
    ["Atrazine", "1912-24-9", "ca. 2.6", 60, "<10", 215.68, None, None],
    ["Nonsense", "50-29-4", "see file", "soon", "n/a", True, None, "=1/0"],
]


def lists():
    book = openpyxl.Workbook()
    sheet = book.active
    sheet.title = "Substances"
    for row in LIST:
        sheet.append(row)
    for row in range(3, 11):
        sheet.cell(row, 7).number_format = "yyyy-mm-dd"
        sheet.cell(row, 3).number_format = "0.00"
    with tempfile.TemporaryDirectory() as folder:
        source = pathlib.Path(folder) / "list.xlsx"
        book.save(source)
        # LibreOffice computes the formulas.
        convert(source, FOLDER, "xlsx")
        convert(source, FOLDER, "xls")


def convert(source, folder, kind="xls"):
    command = ["soffice", "--headless", "--convert-to", kind, "--outdir", str(folder), str(source)]
    subprocess.run(command, check=True, capture_output=True)


SHEETS = """
const X = require('xlsx'), folder = process.argv[1] + '/';
const day = 46357;  // 1 December 2026
const rows = [
  ['Kind', 'Value'], ['text', {t: 's', v: 'Müller'}], ['number', 4.5], ['whole number', 12000], ['negative', -6.91],
  ['large', 1.2e300], ['date', {t: 'n', v: day, z: 'yyyy-mm-dd'}], ['date and time', {t: 'n', v: day + 0.25, z: 'dd.mm.yyyy hh:mm'}],
  ['duration', {t: 'n', v: 1.5, z: '[h]:mm'}], ['percent', {t: 'n', v: 0.25, z: '0.0%'}], ['boolean', true],
  ['error', {t: 'e', v: 42}], ['apostrophe', "'6.91"], ['number in text', '6,91'],
];
const sheet = X.utils.aoa_to_sheet(rows);
X.utils.sheet_add_aoa(sheet, [['after two empty rows']], {origin: 'A17'});
sheet['!cols'] = [{wch: 20}, {wch: 12, hidden: true}];
sheet['!merges'] = [X.utils.decode_range('D1:E2')];
const make = (type, name) => {
  const book = X.utils.book_new();
  for (const key in sheet) if (sheet[key].XF) delete sheet[key].XF;
  X.utils.book_append_sheet(book, sheet, 'Cells');
  for (const other of ['Hidden', 'Very hidden']) X.utils.book_append_sheet(book, X.utils.aoa_to_sheet([[other]]), other);
  book.Workbook = {Sheets: [{Hidden: 0}, {Hidden: 1}, {Hidden: 2}]};
  X.writeFile(book, folder + name, {bookType: type, bookSST: type === 'xlsb'});
};
make('xlsb', 'kinds-of-cells.xlsb');
make('biff8', 'of-2003.xls');
make('biff5', 'of-1995.xls');
make('biff4', 'of-1992.xls');
X.writeFile(X.readFile(folder + 'list.xlsx', {cellNF: true}), folder + 'list.xlsb', {bookType: 'xlsb', bookSST: true});
"""


def with_the_npm_package():
    subprocess.run(["node", "-e", SHEETS, str(FOLDER)], check=True)


def written_xlsb():
    with pyxlsbwriter.XlsbWriter(str(FOLDER / "written.xlsb")) as writer:
        writer.add_sheet("List")
        writer.write_sheet(
            [
                ["CAS", "Name", "log Kow", "Date"],
                ["50-29-3", "DDT", 6.91, datetime.date(2026, 12, 1)],
                ["108-95-2", "Phenol 日本", 1.46, None],
                ["71-43-2", None, 2, datetime.datetime(2026, 12, 1, 6)],
            ]
        )


if __name__ == "__main__":
    FOLDER.mkdir(parents=True, exist_ok=True)
    kinds_of_cells_xls()
    from_1904_xls()
    computed_xls()
    lists()
    with_the_npm_package()
    written_xlsb()
