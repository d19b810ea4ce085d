"""A list as an authority publishes one, in French: ods saved by LibreOffice, dates and booleans typed, a hidden column,
numbers beside texts with a decimal comma, a sheet of explanations in front."""

import datetime
import tempfile
from pathlib import Path

from openpyxl import Workbook

from common import FOLDER, check_numbers, convert, settle

HEADER = [
    "N° d'ordre", "Nom de la substance", "N° CAS", "N° CE", "Formule brute", "Masse molaire (g/mol)",
    "Point de fusion (°C)", "Pression de vapeur à 25 °C (Pa)", "Solubilité dans l'eau (mg/L)",
    "Coefficient de partage n-octanol/eau (log Koe)", "Koc (L/kg)", "Facteur de bioconcentration (BCF, L/kg)",
    "Demi-vie dans l'eau douce (jours)", "Demi-vie dans l'eau de mer (jours)", "Demi-vie dans les sédiments (jours)",
    "Demi-vie dans le sol (jours)", "Facilement biodégradable", "CL50 poisson 96 h (mg/L)", "NOEC long terme (mg/L)",
    "Mentions de danger", "Tonnage annuel (t/an)", "Inscrite le", "Soumise à autorisation", "Suivi interne",
]
DAY = datetime.date
ROWS = [
    [1, "Hexabromocyclododécane", "25637-99-4", "247-148-4", "C12H18Br6", 641.7, "190", 6.3e-5, "0,0656", "5,625",
     45709, 18100, "> 60", None, 101, 119, False, "> 2,5", "0,0031", "H361, H362", "0", DAY(2008, 10, 28), True, "dossier A"],
    [2, "Musc xylène", "81-15-2", "201-329-4", "C12H15N3O6", 297.3, "114", 3e-5, "0,15", "4,9", "7800", 1440,
     None, "> 150", None, None, False, "> 0,5", "0,056", "H228, H351, H410", "12", DAY(2008, 10, 28), True, None],
    [3, "Phtalate de dibutyle", "84-74-2", "201-557-4", "C16H22O4", 278.3, "-35", 0.0027, "10", "4,57", 1158, "1,8",
     3, None, None, 11, True, "0,48", "0,1", "H360Df, H400", "1 250,8", DAY(2008, 10, 28), True, None],
    [4, "Anthracène", "120-12-7", "204-371-1", "C14H10", 178.2, "215,8", 9.4e-4, "0,047", "4,45", "29 512", "2820",
     None, None, None, "175 à 210", False, "0,0012", None, "H410", None, DAY(2008, 10, 28), False, None],
    [5, "Acrylamide", "79-06-1", "201-173-7", "C3H5NO", 71.08, "84,5", 0.9, "2,155E+06", "-0,9", None, "env. 1", None,
     None, None, None, True, "100", None, "H301, H340, H350, H361f, H372", "9000", DAY(2010, 3, 30), False, None],
    [6, "Trichloroéthylène", "79-01-6", "201-167-4", "C2HCl3", 131.4, "-84,8", 9900, "1100", "2,53", 130, 17, None, None,
     None, None, False, "38", None, "H315, H319, H336, H341, H350, H412", "45 000", DAY(2010, 6, 18), True, None],
    [7, "Chromate de plomb", "7758-97-6", "231-846-0", "PbCrO4", 323.2, "844", None, "0,17", "sans objet", None, None, None,
     None, None, None, None, None, None, "H350, H360Df, H373, H410", "30", DAY(2010, 1, 13), True, None],
    [8, "4-tert-Octylphénol", "140-66-9", "205-426-2", "C14H22O", 206.3, "80", 0.21, "19", "4,12", 2740, "261", "30",
     "60", None, "10", False, "0,077", "0,0061", "H315, H318, H410", "250", DAY(2011, 12, 19), False, None],
    [9, "Acide perfluorooctanoïque (APFO)", "335-67-1", "206-397-9", "C8HF15O2", 414.1, "54,3", 4.2, "9500",
     "non déterminé", "115", "3,1", "> 33 580", None, None, None, False, "707", None, "H351, H360D, H362, H372", None,
     DAY(2013, 6, 20), False, "voir note"],
    [10, "Benzo[def]chrysène", "50-32-8", "200-028-5", "C20H12", 252.3, "177", 7.3e-7, "0,0016", "6,13", "831764", "608",
     None, None, "> 700", "120-270", False, None, "0,00021", "H317, H340, H350, H360FD, H410", None, DAY(2016, 6, 20), False, None],
    [11, "Bisphénol A", "80-05-7", "201-245-8", "C15H16O2", 228.3, "155", "4,1×10⁻⁷", "300", "3,4", "715", "≤ 67",
     None, None, None, "3", True, "4,6", "0,016", "H317, H318, H335, H360F", "700 000", DAY(2017, 1, 12), False, None],
    [12, "Octaméthylcyclotétrasiloxane", "556-67-2", "209-136-7", "C8H24O4Si4", 296.6, "17,5", 132, "0,056", "6,488",
     16596, "12 400", "3,9", None, 242, "5,25", False, "> 0,022", "0,0044", "H226, H361f, H410", "> 100 000", DAY(2018, 6, 27), False, None],
    [13, "1,4-Dioxane", "123-91-1", "204-661-8", "C4H8O2", 88.11, "11,8", 4950, "miscible", "-0,42", "14,4", "0,7", None, None, None, None,
     False, "> 1000", "103", "H225, H319, H335, H350", "2000", DAY(2021, 7, 8), False, None],
    [14, "Mélamine", "108-78-1", "203-615-4", "C3H6N6", 126.1, "354", 3.7e-8, "3480", "-1,14", "≈ 13", "< 3,8", None, None, None, None,
     False, "> 3000", "≥ 5,25", "H351, H373", "100000", DAY(2023, 1, 17), False, None],
]
NOTES = [
    ["Liste des substances suivies par l'agence régionale (exemple inventé)"],
    ["Mise à jour : 1er avril 2025"],
    ["Légende : les valeurs proviennent des dossiers ; « env. » signifie environ."],
]


def make():
    check_numbers(ROWS)
    book = Workbook()
    notes = book.active
    notes.title = "Lisez-moi"
    for row in NOTES:
        notes.append(row)
    sheet = book.create_sheet("Liste")
    sheet.append(["Liste des substances", None, None, None, None])
    sheet.append([])
    sheet.append(HEADER)
    for row in ROWS:
        assert len(row) == len(HEADER)
        sheet.append(row)
    for row in sheet.iter_rows(min_row=4, min_col=22, max_col=22):
        row[0].number_format = "DD/MM/YYYY"
    # Without the format LibreOffice would save the booleans as the numbers 1 and 0.
    for column in (17, 23):
        for row in sheet.iter_rows(min_row=4, min_col=column, max_col=column):
            row[0].number_format = "BOOLEAN"
    sheet.column_dimensions["X"].hidden = True
    with tempfile.TemporaryDirectory() as folder:
        source = Path(folder) / "french-list.xlsx"
        book.save(source)
        convert(source, "ods", FOLDER / "french-list.ods")
    settle(FOLDER / "french-list.ods")


if __name__ == "__main__":
    make()
