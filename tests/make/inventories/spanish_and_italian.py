"""Two suppliers' lists in one old workbook (xlwt, xls): a Spanish sheet and an Italian one, each with its own layout, and
a sheet of contacts that is no inventory."""

import datetime

import xlwt

from common import FOLDER, check_numbers

SPANISH = [
    "Código", "Denominación química", "Nº CAS", "Nº CE", "Proveedor", "Contenido (% p/p)", "Peso molecular (g/mol)",
    "Punto de fusión (°C)", "Punto de ebullición (°C)", "Presión de vapor (mmHg)", "Solubilidad en agua (mg/l)",
    "log Kow", "log Koc", "Factor de bioconcentración", "Vida media en suelo (días)", "Vida media en agua dulce (días)",
    "Vida media en sedimento (meses)", "Fácilmente biodegradable", "Indicaciones de peligro", "Consumo anual (t/año)",
    "Fecha de revisión", "Observaciones",
]
DAY = datetime.date
SPANISH_ROWS = [
    ["P-001", "Tolueno", "108-88-3", "203-625-9", "Disolventes Ebro", 99.5, 92.14, -95, 110.6, 28.4, 526, 2.73, 2.15, 90, 7,
     4, None, "sí", "H225, H304, H315, H336, H361d, H373", 48.5, DAY(2024, 3, 14), None],
    ["P-002", "Acetona", "67-64-1", "200-662-2", "Disolventes Ebro", 100, 58.08, -94.7, 56.1, "231", "miscible", -0.24, None,
     None, None, None, None, "Sí", "H225, H319, H336", "1.250,8", DAY(2024, 3, 14), None],
    ["P-003", "Clorpirifos", "2921-88-2", "220-864-4", "Agro Duero", "48", 350.6, 42, None, "2,0E-05", "1,05", "4,7",
     "3,9", "1374", "30-60", "< 5", "2", "no", "H301, H410", "0,8", DAY(2020, 1, 10), "prohibido"],
    ["P-004", "Endosulfán", "115-29-7", "204-079-4", "Agro Duero", "35", 406.9, 106, None, "1,7E-07", "0,32", "4,74",
     "> 4", "2755", "50 a 120", "23", "> 6", "no", "H300, H310+H330, H410", "0", DAY(2020, 1, 10), "prohibido"],
    ["P-005", "Ácido acético", "64-19-7", "200-580-7", "Químicas Tajo", "80", 60.05, 16.6, 118, 15.7, "miscible", -0.17, None,
     3.16, None, None, None, "sí (96 %, 20 d)", "H226, H314", "220", DAY(2023, 5, 2), None],
    ["P-006", "Nonilfenol", "25154-52-3", "246-672-0", "Químicas Tajo", "aprox. 95", 220.4, -8, 295, "0,0023", "5,7", "5,4",
     "4,3", "< 740", "48", "20", "3", "no", "H302, H314, H361fd, H410", "1,2", DAY(2023, 5, 2), None],
    ["P-007", "Hexaclorobenceno", "118-74-1", "204-273-9", "Químicas Tajo", "sin datos", 284.8, 231, 325, "1,8E-05", "0,0062",
     "5,73", "4,7 – 5,9", "22000", "> 900", "no determinado", "> 24", "no", "H350, H372, H410", "0", DAY(2019, 9, 30), None],
    ["P-008", "Glicerina", "56-81-5", "200-289-5", "Oleoquímica Segura", "99,7", 92.09, 18, 290, "0,000168", "miscible",
     -1.75, None, None, None, None, None, "sí", "no clasificado", "35", DAY(2022, 12, 1), None],
    ["P-009", "Carbendazima", "10605-21-7", "234-232-0", "Agro Duero", "50", 191.2, "302 (descompone)", None, "< 7,5E-08", "8",
     "1,5", "2,35", "27", "120", "60", "1", "no", "H317, H340, H360FD, H410", "0,05", DAY(2021, 2, 15), None],
    ["P-010", "Isopropanol", "67-63-0", "200-661-7", "Disolventes Ebro", "70", 60.1, -88.5, 82.5, 45.4, "miscible", 0.05,
     None, None, None, None, None, "sí", "H225, H319, H336", "66", DAY(2024, 3, 14), "recipiente IBC"],
]

ITALIAN = [
    "N.", "Nome della sostanza", "Numero CAS", "Numero CE", "Impiego", "Fornitore", "Concentrazione (%)", "Log Pow",
    "Idrosolubilità (g/l)", "Tensione di vapore (hPa)", "Emivita nel suolo (giorni)", "Emivita in acqua (ore)",
    "BCF (l/kg)", "Facilmente biodegradabile", "EC50 Daphnia 48 h (mg/l)", "Indicazioni di pericolo", "Note",
]
ITALIAN_ROWS = [
    [1, "Dietilftalato", "84-66-2", "201-550-6", "plastificante", "Resine Adda", "2,5", "2,2", "0,93", "0,0028", "3", "60", "117",
     "sì", "90", "nessuna", None],
    [2, "Permetrina", "52645-53-1", "258-067-9", "insetticida", "Agri Brenta", "25", "6,1 (HPLC)", "5,5E-06", "7E-08",
     "circa 42", "450", "570", "no", "0,0006", "H302, H317, H332, H410", "cis/trans 25:75"],
    [3, "Linalolo", "78-70-6", "201-134-4", "profumo", "Essenze Arno", "0,8", "2,9", "1,56", "0,27", None, None, None, "sì", "59",
     "H315, H317, H319", None],
    [4, "Galaxolide (HHCB)", "1222-05-5", "214-946-9", "profumo", "Essenze Arno", "1,2", "5,3", "0,00175", "0,000727", "tra 95 e 239",
     "100", "1584", "no", "0,9", "H410", None],
    [5, "Glifosato", "1071-83-6", "213-997-4", "erbicida", "Agri Brenta", "36", "-3,2", "10,5", "1,31E-07", "da 5 a 49", "n.d.",
     "0,52", "no", "40", "H318, H411", None],
    [6, "Limonene", "5989-27-5", "227-813-5", "solvente", "Essenze Arno", "fino a 5", "4,38", "insolubile", "2", None, None, "660",
     "sì", "0,307", "H226, H304, H315, H317, H410", None],
    [7, "Tetracloroetilene", "127-18-4", "204-825-9", "solvente", "Resine Adda", "99", "2,53", "0,15", "19", "> 300", "non disponibile", "49",
     "no", "8,5", "H351, H411", None],
    [8, "Carburante per accendini", "64742-49-0", "265-151-9", "combustibile", "Resine Adda", "100", "tra 2,1 e 6", "0,01", "> 100", None,
     None, None, "sì", "4,5", "H224, H304, H315, H336, H340, H350, H411", "UVCB"],
]

CONTACTS = [["Empresa", "Persona", "Teléfono"], ["Disolventes Ebro", "M. Roca", "+34 900 000 001"],
            ["Resine Adda", "L. Fiore", "+39 800 000 002"]]


def write(sheet, rows, first_row):
    date = xlwt.easyxf(num_format_str="DD/MM/YYYY")
    for index, row in enumerate(rows, first_row):
        for column, value in enumerate(row):
            if isinstance(value, datetime.date):
                sheet.write(index, column, value, date)
            elif value is not None:
                sheet.write(index, column, value)


def make():
    check_numbers(SPANISH_ROWS + ITALIAN_ROWS)
    assert all(len(row) == len(SPANISH) for row in SPANISH_ROWS)
    assert all(len(row) == len(ITALIAN) for row in ITALIAN_ROWS)
    book = xlwt.Workbook(encoding="utf-8")
    sheet = book.add_sheet("Proveedores ES")
    sheet.write_merge(0, 0, 0, 5, "Lista de sustancias de los proveedores")
    write(sheet, [SPANISH] + SPANISH_ROWS, 2)
    write(book.add_sheet("Fornitori IT"), [ITALIAN] + ITALIAN_ROWS, 0)
    write(book.add_sheet("Contactos"), CONTACTS, 0)
    book.save(str(FOLDER / "spanish-and-italian.xls"))


if __name__ == "__main__":
    make()
