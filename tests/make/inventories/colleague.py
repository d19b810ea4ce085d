"""A colleague's own workbook (openpyxl): header in row 7, blank rows, notes, several languages, CAS numbers that became
dates, apostrophes, several values in a cell, colours; a second sheet with another layout; a sheet to look things up in."""

import datetime

from openpyxl import Workbook
from openpyxl.styles import Font, PatternFill

from common import FOLDER, cas, check_numbers, settle

HEADER = ["lfd. Nr.", "Stoff / substance", "CAS", "Hersteller", "logKow (gemessen?)", "Löslichkeit in H2O", "t½ Boden", "t1/2 water",
          "BCF", "leicht bioabbaubar?", "GHS H-statements", "Menge t/Jahr", "Bemerkung / notes"]
DATE = datetime.date
# Picloram, lenacil and epsilon-HCH, whose numbers look like days.
DATES = {"1918-02-1": DATE(1918, 2, 1), "2164-08-1": DATE(2164, 8, 1), "6108-10-7": DATE(6108, 10, 7)}
GROUP = "— Pflanzenschutz / pesticides —"
ROWS = {
    8: [1, "Picloram", DATES["1918-02-1"], "Agro Süd", "-1,9 (pH 7)", "560 mg/L", "20 - 300 d", "> 30 d", "0,5", "nein", "H319; H412", 0.02, None],
    9: [2, "Lenacil", DATES["2164-08-1"], "Agro Süd", "1,69", "2,9 mg/l", "ca. 60 Tage", None, "7", "no", "H351 H410", 0.1, "fragen: neues SDB"],
    10: [3, "Toluene (techn.)", "'108-88-3", "Solvent Hub", "2.73", "0.52 g/L", "1 wk", "4 d", "90", "ja", "H225, H304, H315, H336, H361d, H373",
         "48,5", None],
    12: [GROUP] + [None] * 12,
    13: [4, "epsilon-HCH", DATES["6108-10-7"], "?", "3,9 / 4,3", "< 0.5 mg/L", "> 6 Monate", "n.b.", "1500-2000", "nein", "?", None, "nur Altbestand"],
    14: [5, "Chlorpyrifos", "2921-88-2", "Agro Süd", "4.7; 5.0", "1,05 mg/L", "30–60 d", "< 5 d", "1374 L/kg (ww)", "no (22 %, 28 d)", "H301, H410", "0,8", "ausphasen!"],
    15: [6, "DEET", "134-62-3", "Bayou Chem", "'2.4", "11,2 g/l", "unbekannt", "> 90 d", "22 (fish)", "yes / ja", "H302 H315 H319 H412", 1.5, None],
    17: [7, "Schmieröl-Additiv XB-7", "68649-42-3 / 84605-29-8", "Lube & Co", "> 6", "unlöslich", None, None, None, "nein", "H315 H318 H411", 12,
         "zwei CAS im SDB"],
    18: [8, "Terbutryn", "886-50-0", "Agro Süd", "3.66 (OECD 117)", "25 ppm", "52", "180 - 240 Tage", "181", "nein (0 %)", "H302, H317, H410", "0.01",
         "prüfen"],
    19: [9, "Isothiazolinone C(M)IT", "55965-84-9", "Bayou Chem", "0.401", "mischbar", "0,3 d", "1.8-2.5 d", "3,6", "nein", "H301, H310, H314, H317, H330, H410",
         "0,005", "Gemisch 3:1"],
    20: [10, "Diclofenac", "15307-86-5", "Pharma Wald", "4.51", "2.37 mg/l", "3–20 d", "8 d", "10", "no", "H301 H361 H411", None, "nur Labor"],
    21: [11, "Carbamazepin", "298-46-4", "Pharma Wald", "2,45", "18 mg/L (25 °C)", "> 495 d", "> 1 Jahr", None, "nein", "n.a.", 0.001, "nur Labor"],
    22: [12, "Tippfehler-Stoff", "108-88-4", None, "2.7.3", "12 mgl", "bald", "3 Kisten", "0", "vielleicht", "toxisch", "viel", "Testzeile Azubi"],
}
CODES = [["H-Code", "Bedeutung", "meaning"], ["H225", "Flüssigkeit und Dampf leicht entzündbar", "highly flammable liquid and vapour"],
         ["H301", "Giftig bei Verschlucken", "toxic if swallowed"], ["H350", "Kann Krebs erzeugen", "may cause cancer"],
         ["H410", "Sehr giftig für Wasserorganismen, Langzeitwirkung", "very toxic to aquatic life, long lasting"]]
NEW = [
    ["CAS-No", "IUPAC name", "Kow [log]", "DT50 Sediment (Wochen)", "Koc", "Verwendung", "Ersatz für"],
    ["112-34-5", "2-(2-butoxyethoxy)ethanol", 0.56, None, 2, "Lösemittel", None],
    ["57-55-6", "propane-1,2-diol", -1.07, 1, "2.9", "Frostschutz", "107-21-1"],
    ["110-27-0", "propan-2-yl tetradecanoate", "7.17", 3, "> 4000", "Kosmetik", None],
    ["3319-31-1", "tris(2-ethylhexyl) benzene-1,2,4-tricarboxylate", "8 (calc.)", "> 26", "log Koc 5.6", "Weichmacher", "117-81-7"],
    ["166412-78-8", "bis(7-methyloctyl) cyclohexane-1,2-dicarboxylate", "10", "12-20", "5E5", "Weichmacher", "117-81-7"],
]


def make():
    check_numbers(row for row in ROWS.values() if row[1] != "Tippfehler-Stoff")
    for number in list(DATES) + [row[0] for row in NEW[1:]]:
        cas(number)
    book = Workbook()
    sheet = book.active
    sheet.title = "Stoffe 2025"
    sheet["A1"] = "meine Liste, bitte nicht umsortieren!!"
    sheet["A1"].font = Font(bold=True, color="FF0000")
    sheet["A3"] = "Stand:"
    sheet["B3"] = DATE(2025, 3, 28)
    sheet["D4"] = "gelb = noch offen"
    sheet["D4"].fill = PatternFill("solid", fgColor="FFFF00")
    sheet["M5"] = "Quelle: SDB + Anrufe"
    for column, header in enumerate(HEADER, 1):
        sheet.cell(7, column, header).font = Font(bold=True)
    for index, row in ROWS.items():
        assert len(row) == len(HEADER)
        for column, value in enumerate(row, 1):
            if value is not None:
                cell = sheet.cell(index, column, value)
                if isinstance(value, datetime.date):
                    cell.number_format = "yyyy-mm-dd"
                if index in (9, 14, 18):
                    cell.fill = PatternFill("solid", fgColor="FFFF00")
    sheet.merge_cells("A12:M12")
    sheet["A12"].fill = PatternFill("solid", fgColor="D9D9D9")
    sheet["A24"] = "offen: Nr. 2, 5 und 8"
    new = book.create_sheet("Neu")
    for row in NEW:
        new.append(row)
    codes = book.create_sheet("H-Sätze")
    for row in CODES:
        codes.append(row)
    path = FOLDER / "colleague.xlsx"
    book.save(path)
    settle(path)


if __name__ == "__main__":
    make()
