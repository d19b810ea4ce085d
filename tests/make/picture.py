"""Makes inputs-example/annotated.png from a screened example.

Needs LibreOffice (soffice), poppler (pdftoppm) and the PyPI package openpyxl:
    kowledger screen inputs-example/inventory.xlsx --output /tmp/screened.xlsx --force
    python tests/make/picture.py /tmp/screened.xlsx inputs-example/annotated.png

The picture shows the program's own cells; only columns are hidden so that it fits a page.
"""

import pathlib
import subprocess
import sys
import tempfile

import openpyxl
from openpyxl.utils import get_column_letter
from openpyxl.worksheet.properties import PageSetupProperties

SHOWN = {"CAS No.", "Substance name", "log Kow used", "log Kow basis", "REACH", "REACH why", "CLP", "STOCKHOLM", "CANADA"}
ROWS = {4, 15, 29, 56, 66, 84, 91, 98, 107}


def main(screened: str, picture: str) -> None:
    book = openpyxl.load_workbook(screened)
    for name in book.sheetnames:
        if name != "Substances":
            book[name].sheet_state = "hidden"
    sheet = book["Substances"]
    header = next(row[0].row for row in sheet.iter_rows() if any(cell.value == "log Kow used" for cell in row))
    for cell in sheet[header]:
        hidden = str(cell.value).replace("\n", " ") not in SHOWN
        dimension = sheet.column_dimensions[get_column_letter(cell.column)]
        dimension.hidden, dimension.outlineLevel = hidden, 0
    for row in range(1, sheet.max_row + 1):
        sheet.row_dimensions[row].hidden = row != header and row not in ROWS
    sheet.freeze_panes = None
    sheet.page_setup.orientation = "landscape"
    sheet.page_setup.fitToWidth, sheet.page_setup.fitToHeight = 1, 0
    sheet.sheet_properties.pageSetUpPr = PageSetupProperties(fitToPage=True)
    with tempfile.TemporaryDirectory() as folder:
        copy = pathlib.Path(folder, "copy.xlsx")
        book.save(copy)
        subprocess.run(["soffice", "--headless", "--convert-to", "pdf", "--outdir", folder, str(copy)], check=True, capture_output=True)
        stem = picture.removesuffix(".png")
        crop = ["-x", "85", "-y", "95", "-W", "1265", "-H", "495"]
        command = ["pdftoppm", "-png", "-r", "130", *crop, "-singlefile", str(pathlib.Path(folder, "copy.pdf")), stem]
        subprocess.run(command, check=True)


if __name__ == "__main__":
    main(*sys.argv[1:3])
