"""Results of a laboratory as a data frame is saved (pandas): an index column, a header of two levels above a row with the
name of the index, values with qualifiers, ranges, deviations and conditions in brackets."""

import datetime

import pandas

from common import FOLDER, check_numbers, settle

COLUMNS = [
    ("Substance", "Name"), ("Substance", "CAS"), ("Substance", "SMILES"), ("Substance", "Molar mass (g/mol)"),
    ("Partitioning", "log Kow"), ("Partitioning", "log Kow method"), ("Partitioning", "Koc (L/kg)"),
    ("Partitioning", "pKa (acid)"), ("Water solubility", "mg/L"), ("Vapour pressure", "Pa"),
    ("Half-life", "soil (d)"), ("Half-life", "water-sediment system, sediment (d)"), ("Half-life", "fresh water (d)"),
    ("Half-life", "hydrolysis (d)"), ("Ready biodegradation", "% after 28 d"), ("Ecotoxicity", "EC50 Daphnia 48 h (mg/L)"),
    ("Ecotoxicity", "NOEC fish (mg/L)"), ("Bioconcentration", "BCF (L/kg)"), ("Quality", "reliability"),
    ("Quality", "analyst"), ("Quality", "date"),
]
DAY = datetime.date
ROWS = {
    "L25-001": ["Imazalil", "35554-44-0", "C=CCOC(Cn1ccnc1)c1ccc(Cl)cc1Cl", 297.2, "3.82 ± 0.05 (25 °C, pH 9.2)", "OECD 107",
                "2081 – 8150", None, "184 (20 °C, pH 7.6)", "1.58E-4 (20 °C)", "44-128 (20 °C, OECD 307)", "148 (20 °C)", "6.0",
                "> 30", "6 %", "3.5", "0.043", "48.7-63.8", 1, "jk", DAY(2025, 1, 14)],
    "L25-002": ["Metazachlor", "67129-08-2", "Cc1cccc(C)c1N(Cn1cccn1)C(=O)CCl", 277.8, "2.49 [22 °C]", "OECD 117", "54–220", None,
                "450 ± 20", "9.3E-5", "2.8 – 21.3 (20 °C)", "20.6", "216", "stable", "0-10 %", "33", "2.5", "n.d.", 1, "jk", DAY(2025, 1, 14)],
    "L25-003": ["Diflufenican", "83164-33-4", "O=C(Nc1ccc(F)cc1F)c1cccnc1Oc1cccc(c1)C(F)(F)F", 394.3, "4.2 (pH 7)", "OECD 107",
                "1622 to 2369", None, "< 0.05", "4.25E-6", "ca. 142 (20 °C)", "> 175", "> 100", "stable", "1 %", "> 0.24", "0.015",
                "1276–1596 (fish, 5 % lipid)", 2, "jk", DAY(2025, 1, 20)],
    "L25-004": ["Bentazone", "25057-89-0", "CC(C)N1C(=O)c2ccccc2NS1(=O)=O", 240.3, "-0.46 (pH 7)", "OECD 107", "13 - 176", "3.51",
                "570 (pH 3)", "1.7E-4", "8-102", "n.d.", "523", "> 365", "< 5 %", "> 100", "48", "19 (±2)", 1, "mt", DAY(2025, 1, 20)],
    "L25-005": ["Boscalid", "188425-85-6", "O=C(Nc1ccccc1-c1ccc(Cl)cc1)c1cccnc1Cl", 343.2, "2.96 ± 0.02", "OECD 117", "507–1110", None,
                "4.64 (20 °C)", "7.2E-7", "98–365 (mean 200)", "> 365", "< 2", "> 30", "0 % (O2)", "5.33", "0.125", "57–70", 1, "mt",
                DAY(2025, 2, 3)],
    "L25-006": ["Caffeine", "58-08-2", "Cn1c(=O)c2c(ncn2C)n(C)c1=O", 194.2, "-0.07", "shake flask", "~ 22", None, "21.7 g/L",
                "< 1E-5", "< 7", "n/a", "5 – 15", "n/a", "90-100 % (O2)", "182", ">= 10", "n/a", 2, "mt", DAY(2025, 2, 3)],
    "L25-007": ["Galaxolide", "1222-05-5", None, 258.4, "5.3 (± 0.3)", "calculated", "4.1 (log)", None, "1.75 mg/L (25 °C)", "0.0727",
                "105 (12 °C)", "79 d (25 °C)", "100 h", "n/a", "21 %, day 28", "0.282 mg/L (21 d)", "0.068 mg/L", "1584 (bluegill)", 2,
                "jk", DAY(2025, 2, 17)],
    "L25-008": ["Climbazole", "38083-17-9", "CC(C)(C)C(=O)C(n1ccnc1)Oc1ccc(Cl)cc1", 292.8, "3.76", "OECD 117", "1200 ± 150", None,
                "8.281 (20 °C)", "9.5E-6", "> 120 (aerobic)", "120–190", "5.2 wk", "> 1 a", "3.4 %", "15.5", "0.0057", "1.5-27", 3, "jk",
                DAY(2025, 2, 17)],
    "L25-009": ["Tolyltriazole", "29385-43-1", None, 133.2, "1.081", "OECD 117", "178", "8.8", "3069", "0.00306", "< LOD", "n.d.",
                "> 60", "> 365", "4 %", "8.58", "0.4", "< 10", 1, "mt", DAY(2025, 3, 3)],
    "L25-010": ["Sodium benzoate", "532-32-1", "[Na+].[O-]C(=O)c1ccccc1", 144.1, "1.88 (free acid)", "calculated", "n.d.", "4.2",
                "556 g/L (20 °C)", "n/a", "2.3", "n/a", "0.8", "n/a", "87 % (CO2, 28 d; OECD 301B)", "650", "> 100", "n/a", 2, "mt",
                DAY(2025, 3, 3)],
    "L25-011": ["Perfluorobutanesulfonic acid", "375-73-5", "OS(=O)(=O)C(F)(F)C(F)(F)C(F)(F)C(F)(F)F", 300.1, "1.82 (est.)", "calculated",
                "2.1–30", "< 0.3", "> 1E5", "631", "> 1000", "> 1000", "> 1000", "> 1000", "0 %", "2183", "502", "< 1", 2, "jk",
                DAY(2025, 3, 10)],
    "L25-012": ["Blank (water)", None, None, None, None, None, None, None, None, None, None, None, None, None, None, None, None, None,
                None, "jk", DAY(2025, 3, 10)],
}


def make():
    check_numbers(ROWS.values())
    assert all(len(row) == len(COLUMNS) for row in ROWS.values())
    frame = pandas.DataFrame.from_dict(ROWS, orient="index", columns=pandas.MultiIndex.from_tuples(COLUMNS))
    frame.index.name = "Sample ID"
    path = FOLDER / "lab-sheet.xlsx"
    with pandas.ExcelWriter(path, engine="openpyxl") as writer:
        frame.to_excel(writer, sheet_name="results")
    settle(path)


if __name__ == "__main__":
    make()
