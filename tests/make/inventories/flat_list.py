"""A long flat list with headers as a database names its columns (npm package `xlsx`, xlsb)."""

import datetime

import sheetjs
from common import FOLDER, check_numbers

HEADER = [
    "rec_id", "substance_name", "cas_rn", "ec_no", "smiles", "mol_weight_g_mol", "melting_point_c", "vapour_pressure_pa",
    "water_solubility_mg_l", "log_kow", "log_kow_source", "koc_l_kg", "bcf_l_kg", "dt50_soil_d", "dt50_water_d", "dt50_sediment_d",
    "ready_biodegradable", "noec_chronic_mg_l", "hazard_statements", "tonnes_per_year", "last_update", "active",
]
DAY = datetime.datetime
Y, N = "yes", "no"
# name, CAS, EC, SMILES, mass, melting point, vapour pressure, solubility, log Kow, its source, Koc, BCF, soil, water, sediment,
# ready, NOEC, statements, tonnes
SUBSTANCES = [
    ("Benzene", "71-43-2", "200-753-7", "c1ccccc1", 78.11, 5.5, 10000, 1790, 2.13, "exp", 134, 13, 16, 16, None, Y, 0.8, "H225 H304 H315 H319 H340 H350 H372", 5),
    ("Toluene", "108-88-3", "203-625-9", "Cc1ccccc1", 92.14, -95, 3800, 526, 2.73, "exp", 141, 90, 7, 4, None, Y, 0.74, "H225 H304 H315 H336 H361d H373", 48.5),
    ("Ethylbenzene", "100-41-4", "202-849-4", "CCc1ccccc1", 106.17, -95, 1276, 169, 3.15, "exp", 520, 15, 10, 6, None, Y, 0.96, "H225 H304 H332 H373 H412", 3.1),
    ("Styrene", "100-42-5", "202-851-5", "C=Cc1ccccc1", 104.15, -31, 853, 300, 2.95, "exp", 352, 74, 28, 28, None, Y, 1.01, "H226 H315 H319 H332 H361d H372", 14),
    ("Cumene", "98-82-8", "202-704-5", "CC(C)c1ccccc1", 120.19, -96, 611, 61.3, 3.66, "exp", 884, 94, None, None, None, Y, 0.35, "H226 H304 H335 H350 H411", 0.6),
    ("Chlorobenzene", "108-90-7", "203-628-5", "Clc1ccccc1", 112.56, -45, 1600, 498, 2.84, "exp", 268, 40, 75, 150, None, N, 0.32, "H226 H315 H332 H411", 2),
    ("1,2-Dichlorobenzene", "95-50-1", "202-425-9", "Clc1ccccc1Cl", 147, -17, 181, 156, 3.43, "exp", 379, 270, 180, 180, None, N, 0.37, "H302 H315 H319 H335 H410", 1.5),
    ("1,4-Dichlorobenzene", "106-46-7", "203-400-5", "Clc1ccc(Cl)cc1", 147, 53, 232, 81.3, 3.44, "exp", 434, 296, 180, 180, None, N, 0.2, "H319 H351 H410", 0.9),
    ("Hexachlorobenzene", "118-74-1", "204-273-9", "Clc1c(Cl)c(Cl)c(Cl)c(Cl)c1Cl", 284.78, 231, 0.0023, 0.0062, 5.73, "exp", 50000, 22000, 2000, 1500, 2000, N, 0.0047, "H350 H372 H410", 0),
    ("Nitrobenzene", "98-95-3", "202-716-0", "O=[N+]([O-])c1ccccc1", 123.11, 5.7, 20, 1900, 1.86, "exp", 154, 15, 56, 30, None, N, 2.6, "H301 H311 H331 H351 H360F H372 H412", 22),
    ("Aniline", "62-53-3", "200-539-3", "Nc1ccccc1", 93.13, -6, 40, 36000, 0.91, "exp", 410, 2.6, 4, 3.5, None, Y, 0.016, "H301 H311 H317 H318 H331 H341 H351 H372 H400", 31),
    ("Phenol", "108-95-2", "203-632-7", "Oc1ccccc1", 94.11, 40.9, 47, 84000, 1.47, "exp", 82.8, 17.5, 2, 1.5, None, Y, 0.077, "H301 H311 H314 H331 H341 H373 H411", 3.2),
    ("p-Cresol", "106-44-5", "203-398-6", "Cc1ccc(O)cc1", 108.14, 34.8, 15, 21500, 1.94, "exp", 49, 14, 1, 1, None, Y, 1, "H301 H311 H314", 1),
    ("Pentachlorophenol", "87-86-5", "201-778-6", "Oc1c(Cl)c(Cl)c(Cl)c(Cl)c1Cl", 266.34, 191, 0.015, 14, 5.12, "exp", 3000, 1000, 178, 46, 120, N, 0.011, "H301 H311 H315 H319 H330 H335 H351 H410", 0),
    ("Naphthalene", "91-20-3", "202-049-5", "c1ccc2ccccc2c1", 128.17, 80.2, 11, 31, 3.3, "exp", 1000, 427, 20, None, None, N, 0.37, "H302 H351 H410", 0.8),
    ("Anthracene", "120-12-7", "204-371-1", "c1ccc2cc3ccccc3cc2c1", 178.23, 216, 0.00036, 0.045, 4.5, "exp", 29500, 2820, 210, None, None, N, 0.0012, "H410", 0.01),
    ("Phenanthrene", "85-01-8", "201-581-5", "c1ccc2c(c1)ccc1ccccc12", 178.23, 99, 0.016, 1.15, 4.46, "exp", 16690, 2630, 200, None, None, N, 0.013, "H302 H410", 0.01),
    ("Pyrene", "129-00-0", "204-927-3", "c1cc2ccc3cccc4ccc(c1)c2c34", 202.25, 151, 0.0006, 0.135, 4.88, "exp", 54300, 1474, 1900, None, None, N, 0.0012, "H410", 0.01),
    ("Benzo[a]pyrene", "50-32-8", "200-028-5", "c1ccc2c(c1)cc1ccc3cccc4ccc2c1c34", 252.31, 177, 7.3e-7, 0.0016, 6.13, "exp", 831764, 608, 530, None, 700, N, 0.00021, "H317 H340 H350 H360FD H410", 0),
    ("Dibutyl phthalate", "84-74-2", "201-557-4", "CCCCOC(=O)c1ccccc1C(=O)OCCCC", 278.34, -69, 0.0097, 10, 4.57, "exp", 1158, 1.8, 11, 3, None, Y, 0.1, "H360Df H400", 12),
    ("Diethylhexyl phthalate", "117-81-7", "204-211-0", "CCCCC(CC)COC(=O)c1ccccc1C(=O)OCC(CC)CCCC", 390.56, -50, 3.4e-5, 0.003, 7.5, "exp", 165000, 840, 25, 5, 300, Y, None, "H360FD", 18),
    ("Tributyl phosphate", "126-73-8", "204-800-2", "CCCCOP(=O)(OCCCC)OCCCC", 266.31, -70, 0.15, 280, 4, "exp", 1530, 35, 14, 2, None, Y, 0.66, "H302 H315 H351", 0.6),
    ("Triphenyl phosphate", "115-86-6", "204-112-2", "O=P(Oc1ccccc1)(Oc1ccccc1)Oc1ccccc1", 326.28, 49, 0.00084, 1.9, 4.63, "exp", 3561, 420, 37, 5, 40, Y, 0.037, "H410", 1.3),
    ("Tris(2-chloroethyl) phosphate", "115-96-8", "204-118-5", "O=P(OCCCl)(OCCCl)OCCCl", 285.49, -55, 0.00114, 7820, 1.78, "exp", 110, 5.1, 167, None, None, N, 13, "H302 H351 H360F H411", 0.2),
    ("Hexabromocyclododecane", "25637-99-4", "247-148-4", "BrC1CCC(Br)C(Br)CCC(Br)C(Br)CCC1Br", 641.7, 190, 6.3e-5, 0.0656, 5.625, "exp", 45709, 18100, 119, None, 101, N, 0.0031, "H361 H362", 0),
    ("Methyl tert-butyl ether", "1634-04-4", "216-653-1", "COC(C)(C)C", 88.15, -109, 33000, 42000, 1.06, "exp", 9.1, 1.5, 180, 180, None, N, 26, "H225 H315", 7.5),
    ("1,4-Dioxane", "123-91-1", "204-661-8", "C1COCCO1", 88.11, 11.8, 4950, None, -0.42, "exp", 14.4, 0.7, None, None, None, N, 103, "H225 H319 H335 H350", 0.4),
    ("Acetone", "67-64-1", "200-662-2", "CC(C)=O", 58.08, -94.7, 24000, None, -0.24, "exp", 2, 3, None, None, None, Y, 2212, "H225 H319 H336", 1250),
    ("Ethanol", "64-17-5", "200-578-6", "CCO", 46.07, -114, 5726, None, -0.35, "exp", 1, 0.66, None, None, None, Y, 9.6, "H225 H319", 320),
    ("Trichloroethylene", "79-01-6", "201-167-4", "ClC=C(Cl)Cl", 131.39, -84.8, 9900, 1100, 2.53, "exp", 130, 17, 300, 300, None, N, 2.3, "H315 H319 H336 H341 H350 H412", 0.1),
    ("Tetrachloroethylene", "127-18-4", "204-825-9", "ClC(Cl)=C(Cl)Cl", 165.83, -22, 1900, 150, 2.53, "exp", 141, 49, 300, 300, None, N, 0.51, "H351 H411", 5),
    ("Carbon tetrachloride", "56-23-5", "200-262-8", "ClC(Cl)(Cl)Cl", 153.82, -23, 11900, 846, 2.83, "exp", 115, 40, 300, 7000, None, N, 0.07, "H301 H311 H331 H351 H372 H412 H420", 0),
    ("Triclosan", "3380-34-5", "222-182-2", "Oc1cc(Cl)ccc1Oc1ccc(Cl)cc1Cl", 289.54, 57, 0.00053, 10, 4.76, "exp", 47454, 8700, 18, 40, 56, N, 0.0007, "H315 H319 H410", 0.05),
    ("Bisphenol A", "80-05-7", "201-245-8", "CC(C)(c1ccc(O)cc1)c1ccc(O)cc1", 228.29, 156, 4.1e-7, 300, 3.4, "exp", 715, 67, 3, None, None, Y, 0.016, "H317 H318 H335 H360F", 2.4),
    ("4-tert-Octylphenol", "140-66-9", "205-426-2", "CC(C)(C)CC(C)(C)c1ccc(O)cc1", 206.32, 80, 0.21, 19, 4.12, "exp", 2740, 261, 10, 30, 60, N, 0.0061, "H315 H318 H410", 0.3),
    ("Perfluorooctanoic acid", "335-67-1", "206-397-9", "OC(=O)C(F)(F)C(F)(F)C(F)(F)C(F)(F)C(F)(F)C(F)(F)C(F)(F)F", 414.07, 54.3, 4.2, 9500, 4.81, "calc", 115, 3.1, None, 33580, None, N, None, "H302 H332 H351 H360D H362 H372", 0),
    ("Octamethylcyclotetrasiloxane", "556-67-2", "209-136-7", "C[Si]1(C)O[Si](C)(C)O[Si](C)(C)O[Si](C)(C)O1", 296.62, 17.5, 132, 0.056, 6.488, "exp", 16596, 12400, 5.25, 3.9, 242, N, 0.0044, "H226 H361f H410", 6.4),
    ("Atrazine", "1912-24-9", "217-617-8", "CCNc1nc(Cl)nc(NC(C)C)n1", 215.68, 176, 3.9e-5, 33, 2.5, "exp", 100, 4.3, 75, 80, 80, N, 0.1, "H317 H373 H410", 0.001),
    ("Diuron", "330-54-1", "206-354-4", "CN(C)C(=O)Nc1ccc(Cl)c(Cl)c1", 233.1, 158, 1.1e-6, 36.4, 2.87, "exp", 680, 14, 90, None, 48, N, 0.056, "H302 H351 H373 H410", 0.2),
    ("Musk xylene", "81-15-2", "201-329-4", None, 297.26, 114, 3e-5, 0.15, 4.9, "exp", 7800, 1440, None, 150, None, N, 0.056, "H228 H351 H410", 0),
]


def make():
    rows = [[number, *values[:17], values[17], values[18], DAY(2024, 1 + number % 12, 1 + number % 28), number % 7 != 0]
            for number, values in enumerate(SUBSTANCES, 1)]
    check_numbers(rows)
    assert len(rows) == 40 and all(len(row) == len(HEADER) for row in rows)
    sheetjs.write(FOLDER / "flat-list.xlsb", "export", [HEADER, *rows])


if __name__ == "__main__":
    make()
