"""A supplier's list (openpyxl): merged title, a header of two rows with groups merged over their columns, cells merged
downwards, footnotes below."""

from openpyxl import Workbook
from openpyxl.styles import Alignment, Font, PatternFill

from common import FOLDER, check_numbers, settle

UPPER = ["Product", "Substance", None, None, "Content", "Partitioning", None, None, "Half-life", None, None, None, None,
         "Aquatic toxicity", None, "Ready biodegradability", "Remarks"]
LOWER = [None, "Name", "CAS No.", "EC No.", "[% w/w]", "log Kow", "log Koc", "BCF [L/kg]", "fresh water [d]",
         "marine water [d]", "sediment [d]", "soil [d]", "air [h]", "acute L(E)C50 [mg/L]", "NOEC [mg/L]", None, None]
MERGED = ["A1:Q1", "A2:Q2", "A6:A7", "B6:D6", "F6:H6", "I6:M6", "N6:O6", "P6:P7", "Q6:Q7", "A8:A10", "A11:A13",
          "A14:A16", "A17:A18", "A19:A21"]

ROWS = [
    ["Harbofix 20", "Dibutyl phthalate", "84-74-2", "201-557-4", "10-15", 4.5, 3.14, 2.1, 3, None, None, 11, 42, 0.48, 0.1,
     "yes (81 %, 28 d)", None],
    [None, "2-(2-Butoxyethoxy)ethanol", "112-34-5", "203-961-6", "< 5", 0.56, None, None, None, None, None, None, 11,
     1300, ">= 100", "yes", None],
    [None, "1,2-Benzisothiazol-3(2H)-one", "2634-33-5", "220-120-9", 0.05, 0.7, 0.97, 6.95, None, None, None,
     "< 1", None, 0.8, 0.04, "no", "preservative"],
    ["Harbofix 40", "Tris(2-chloro-1-methylethyl) phosphate", "13674-84-5", "237-158-7", 40, 2.68, 2.76, "0.8-14",
     "> 60", None, None, None, 8.6, 51, 13, "no (14 %, 28 d)", None],
    [None, "Triphenyl phosphate", "115-86-6", "204-112-2", 5, 4.63, "3.4–3.6", 420, "3 - 12", None, 40, 37, 36, 0.36, 0.037,
     "yes (83-94 %, 28 d)", None],
    [None, "4-Nonylphenol, branched", "84852-15-3", "284-325-5", "≤ 0.1", "5.4*", 4.35, "≤ 740", 20, None, None, 48, 7.5,
     0.0844, 0.0039, "no", "see note 2"],
    ["Harbolube", "Medium-chain chlorinated paraffins", "85535-85-9", "287-477-0", "25 - 30", "5.5-8.2", "5.0 – 5.2",
     "> 2000", None, None, "> 180", "> 180", "24 to 48", 0.006, 0.01, "no", "UVCB"],
    [None, "2,6-Di-tert-butyl-p-cresol", "128-37-0", "204-881-4", 0.5, 5.1, 4.17, 598, None, None, None, None, 14, 0.48, 0.07,
     "no (4.5 %, 28 d)", None],
    [None, "Zinc bis(O,O-diisooctyl) dithiophosphate", "28629-66-5", "249-109-7", "~ 1.2", "n.d.", "n.d.", "n.d.", "n.d.",
     "n.d.", "n.d.", "n.d.", "n.d.", 10, "n.d.", "no", None],
    ["Harboclean A", "d-Limonene", "5989-27-5", "227-813-5", "5-10", 4.38, 3.5, 660, None, None, None, None, 2.6, 0.72, 0.08,
     "yes (80 %, 28 d)", None],
    [None, "Alcohols, C12-14, ethoxylated", "68439-50-9", None, "5-10", None, None, None, None, None, None, None, None, "1-10",
     None, "yes", "surfactant"],
    ["Harboclean B", "Benzotriazole", "95-14-7", "202-394-1", 0.2, 1.44, 2.4, None, "> 60", "> 60", None, None, 30, 55,
     0.97, "no", None],
    [None, "Decamethylcyclopentasiloxane", "541-02-6", "208-764-9", "< 0.1", 8.02, 5.17, 7060, 70.4, None, 1200, 12.6, 165,
     None, None, "no (0.14 %, 28 d)", None],
    [None, "Methanol", "67-56-1", "200-659-6", "< 0.01", -0.77, None, None, None, None, None, None, 432, 15400, None,
     "yes", None],
]

NOTES = [
    "* mean of two determinations",
    "Note 2: the substance is being replaced; ask for the date.",
    "n.d. = not determined. Half-lives were measured at 20 °C unless stated otherwise.",
]


def make():
    check_numbers(ROWS)
    book = Workbook()
    sheet = book.active
    sheet.title = "Product data"
    sheet["A1"] = "HARBOUR ADDITIVES"
    sheet["A1"].font = Font(size=24, bold=True, color="FFFFFF")
    sheet["A1"].fill = PatternFill("solid", fgColor="1F4E78")
    sheet["A1"].alignment = Alignment(horizontal="center")
    sheet["A2"] = "Substance data for customers, issue 7, March 2025"
    sheet["A4"] = "Contact:"
    sheet["B4"] = "product.safety@harbour-additives.example"
    for column, (upper, lower) in enumerate(zip(UPPER, LOWER, strict=True), 1):
        sheet.cell(6, column, upper).font = Font(bold=True)
        sheet.cell(7, column, lower).font = Font(italic=True)
    for index, row in enumerate(ROWS, 8):
        assert len(row) == len(UPPER)
        for column, value in enumerate(row, 1):
            if value is not None:
                sheet.cell(index, column, value)
    for index, note in enumerate(NOTES, 8 + len(ROWS) + 1):
        sheet.cell(index, 1, note)
    for merged in MERGED:
        sheet.merge_cells(merged)
    sheet.freeze_panes = "C8"
    path = FOLDER / "merged-headers.xlsx"
    book.save(path)
    settle(path)


if __name__ == "__main__":
    make()
