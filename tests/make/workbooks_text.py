"""Makes the ods, fods and text fixtures under tests/fixtures/workbooks with other programs' writers.

Needs odfpy, pandas and openpyxl, and LibreOffice as `soffice`:
    python tests/make/workbooks_text.py
What the files hold is written by hand in the tests that read them (src/workbook/read/ods/tests.rs, .../text/tests.rs).
"""

import csv
import datetime
import pathlib
import subprocess
import tempfile

import odf.opendocument
import odf.style
import odf.table
import odf.text
import openpyxl
import openpyxl.comments
import pandas

HERE = pathlib.Path(__file__).resolve().parents[1] / "fixtures" / "workbooks"

WESTERN = [
    ["CAS-Nr.", "Bezeichnung", "log Kow", "Löslichkeit (µg/L)", "Bemerkung"],
    ["50-29-3", "DDT, p,p'-", "6,91", "5,5", "Prüfung bei 20 °C"],
    ["107-06-2", "1,2-Dichlorethan", "1,48", "8,6E6", 'sogenanntes "EDC"; flüchtig'],
    ["00067-56-1", "Méthanol", "-0,77", "", "two\nlines"],
]
JAPANESE = [
    ["CAS番号", "物質名", "log Kow", "水溶解度 (mg/L)", "備考"],
    ["50-29-3", "ジクロロジフェニルトリクロロエタン", "6.91", "0.0055", "20 ℃で測定"],
    ["107-06-2", "1,2-ジクロロエタン", "1.48", "8600", "揮発性; 注意"],
    ["67-56-1", "メタノール", "-0.77", "", "二行\nの備考"],
]
SIMPLIFIED = [
    ["CAS号", "物质名称", "log Kow", "水溶解度 (mg/L)", "备注"],
    ["50-29-3", "滴滴涕", "6.91", "0.0055", "在20 ℃下测定"],
    ["107-06-2", "1,2-二氯乙烷", "1.48", "8600", "易挥发; 注意"],
    ["67-56-1", "甲醇", "-0.77", "", "两行\n备注"],
]
TRADITIONAL = [
    ["CAS號", "物質名稱", "log Kow", "水溶解度 (mg/L)", "備註"],
    ["50-29-3", "滴滴涕", "6.91", "0.0055", "在20 ℃下測定"],
    ["107-06-2", "1,2-二氯乙烷", "1.48", "8600", "易揮發; 注意"],
    ["67-56-1", "甲醇", "-0.77", "", "兩行\n備註"],
]
TEXTS = {
    "utf-8": ("utf-8", WESTERN),
    "utf-8-mark": ("utf-8-sig", JAPANESE),
    "utf-16-le-mark": ("utf-16", SIMPLIFIED),
    "utf-16-be-mark": ("utf-16-be-mark", WESTERN),
    "utf-16-le": ("utf-16-le", JAPANESE),
    "utf-16-be": ("utf-16-be", TRADITIONAL),
    "windows-1252": ("cp1252", WESTERN),
    "shift-jis": ("cp932", JAPANESE),
    "euc-jp": ("euc_jp", JAPANESE),
    "gb18030": ("gb18030", SIMPLIFIED),
    "big5": ("cp950", TRADITIONAL),
}
SEPARATORS = {"comma": ",", "semicolon": ";", "tab": "\t", "bar": "|"}


def texts():
    """One file for each encoding and separator, written by Python's csv module."""
    folder = HERE / "text"
    folder.mkdir(parents=True, exist_ok=True)
    for name, (encoding, rows) in TEXTS.items():
        for word, separator in SEPARATORS.items():
            with tempfile.NamedTemporaryFile("w+", newline="", encoding="utf-8") as file:
                csv.writer(file, delimiter=separator).writerows(rows)
                file.seek(0)
                content = file.read()
            if encoding == "utf-16-be-mark":
                data = b"\xfe\xff" + content.encode("utf-16-be")
            else:
                data = content.encode(encoding)
            (folder / f"{name}-{word}.csv").write_bytes(data)


def typed_workbook(path):
    """Every kind of cell, by openpyxl."""
    book = openpyxl.Workbook()
    sheet = book.active
    sheet.title = "Stock"
    sheet.append(["Kind", "Value"])
    rows = [
        ("number", 4.25, None),
        ("percentage", 0.125, "0.0%"),
        ("currency", 12.5, "#,##0.00 [$€-407]"),
        ("date", datetime.date(2026, 2, 1), "yyyy-mm-dd"),
        ("date and time", datetime.datetime(2026, 2, 1, 18, 0, 0), "yyyy-mm-dd hh:mm"),
        ("time", datetime.time(6, 0, 0), "hh:mm:ss"),
        ("true", True, None),
        ("text", "00067-56-1", "@"),
        ("lines", "two\nlines", None),
        ("spaces", "  a   b ", None),
        ("formula", "=1+2", None),
        ("error", "=1/0", None),
        ("missing", "=NA()", None),
        ("empty text", '=""', None),
    ]
    for number, (kind, value, shown) in enumerate(rows, start=2):
        sheet.cell(number, 1, kind)
        cell = sheet.cell(number, 2, value)
        if shown:
            cell.number_format = shown
    for column in range(3, 8):
        sheet.cell(2, column, "same")
    sheet.cell(30, 1, "after a gap")
    sheet.merge_cells("A40:C41")
    sheet["A40"] = "merged"
    sheet["D40"] = "beside"
    sheet["A2"].comment = openpyxl.comments.Comment("a note of someone", "someone")
    sheet.column_dimensions["A"].width = 22
    sheet.column_dimensions["B"].hidden = True
    sheet.row_dimensions[30].hidden = True
    hidden = book.create_sheet("Hidden list")
    hidden["A1"] = "x"
    hidden.sheet_state = "hidden"
    book.create_sheet("Nothing")
    book.save(path)


def libreoffice():
    """The typed workbook, saved again by LibreOffice."""
    with tempfile.TemporaryDirectory() as folder:
        typed_workbook(f"{folder}/typed.xlsx")
        for kind in ("ods", "fods"):
            subprocess.run(
                ["soffice", "--headless", "--convert-to", kind, "--outdir", folder, f"{folder}/typed.xlsx"],
                check=True,
                capture_output=True,
            )
            (HERE / f"libreoffice.{kind}").write_bytes(pathlib.Path(f"{folder}/typed.{kind}").read_bytes())
        options = "csv:Text - txt - csv (StarCalc):59,34,ANSI,1,,0,false,true,false"
        subprocess.run(
            ["soffice", "--headless", "--convert-to", options, "--outdir", folder, f"{folder}/typed.xlsx"],
            check=True,
            capture_output=True,
        )
        (HERE / "libreoffice.csv").write_bytes(pathlib.Path(f"{folder}/typed.csv").read_bytes())


def by_pandas():
    frame = pandas.DataFrame(
        {
            "CAS": ["50-29-3", "67-56-1"],
            "log Kow": [6.91, -0.77],
            "Checked": [datetime.date(2026, 2, 1), None],
            "Listed": [True, False],
        }
    )
    frame.to_excel(HERE / "pandas.ods", engine="odf", index=False, sheet_name="Substances")


def by_odfpy():
    """Paragraphs, spans, spaces, repeated cells and rows, as odfpy writes them."""
    book = odf.opendocument.OpenDocumentSpreadsheet()
    table = odf.table.Table(name="List")
    row = odf.table.TableRow()
    cell = odf.table.TableCell(valuetype="string")
    paragraph = odf.text.P(text="log ")
    paragraph.addElement(odf.text.Span(text="K"))
    paragraph.addText("ow")
    paragraph.addElement(odf.text.S(c=3))
    paragraph.addText("at 20 °C")
    cell.addElement(paragraph)
    second = odf.text.P(text="second")
    second.addElement(odf.text.LineBreak())
    second.addText("third")
    second.addElement(odf.text.Tab())
    second.addText("end")
    cell.addElement(second)
    row.addElement(cell)
    row.addElement(odf.table.TableCell(numbercolumnsrepeated=3))
    repeated = odf.table.TableCell(valuetype="float", value="1.5", numbercolumnsrepeated=2)
    repeated.addElement(odf.text.P(text="1,5"))
    row.addElement(repeated)
    table.addElement(row)
    table.addElement(odf.table.TableRow(numberrowsrepeated=1000))
    twice = odf.table.TableRow(numberrowsrepeated=2)
    link = odf.table.TableCell(valuetype="string")
    paragraph = odf.text.P()
    paragraph.addElement(odf.text.A(href="https://example.org/", text="a link"))
    link.addElement(paragraph)
    twice.addElement(link)
    table.addElement(twice)
    book.spreadsheet.addElement(table)
    book.save(str(HERE / "odfpy.ods"))


if __name__ == "__main__":
    HERE.mkdir(parents=True, exist_ok=True)
    texts()
    libreoffice()
    by_pandas()
    by_odfpy()
