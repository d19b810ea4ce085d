"""A data file of an older kind: ASCII, commas, headers in capitals, padded CAS numbers, logarithms, kelvin, mmHg, mol/L,
months, years and hours, -999 for no value."""

import csv
import io

from common import FOLDER, cas, check_numbers

HEADER = [
    "NO", "CHEMICAL NAME", "CAS NUMBER", "MOLECULAR FORMULA", "MOLECULAR WEIGHT", "MELTING POINT (K)", "BOILING POINT (K)",
    "VAPOR PRESSURE (MM HG)", "WATER SOLUBILITY (MOL/L)", "HENRY'S LAW CONSTANT (ATM-M3/MOLE)", "LOG KOW", "LOG KOA", "LOG KOC",
    "LOG BCF", "HALF-LIFE IN AIR (HR)", "HALF-LIFE IN WATER (MONTHS)", "HALF-LIFE IN SOIL (YEARS)", "HALF-LIFE IN SEDIMENT (YR)",
    "TEST TEMP (C)", "REFERENCE", "YEAR",
]
ROWS = [
    ["1", "P,P'-DDT", "000050-29-3", "C14H9CL5", "354.49", "381.65", "533", "1.6E-07", "1.55E-08", "8.32E-06", "6.91", "9.82", "5.18",
     "4.71", "37.4", "4", "15", "> 12", "25", "UNPUBLISHED FILE A", "1984"],
    ["2", "LINDANE", "000058-89-9", "C6H6CL6", "290.83", "385.65", "596.55", "4.2E-05", "2.51E-05", "5.14E-06", "3.72", "7.8", "3.0", "3.15",
     "92", "6", "1.2", "1", "25", "UNPUBLISHED FILE A", "1984"],
    ["3", "ALDRIN", "000309-00-2", "C12H8CL6", "364.92", "377.15", "", "1.2E-04", "4.66E-08", "4.4E-05", "6.50", "8.08", "4.69", "4.13",
     "4.2", "0.5", "1.5", "", "25", "UNPUBLISHED FILE B", "1986"],
    ["4", "DIELDRIN", "000060-57-1", "C12H8CL6O", "380.91", "448.65", "", "5.89E-06", "5.12E-07", "1.0E-05", "5.40", "8.13", "4.08", "3.65",
     "18", "12", "3", "-999", "25", "UNPUBLISHED FILE B", "1986"],
    ["5", "HEXACHLOROBENZENE", "000118-74-1", "C6CL6", "284.78", "504.95", "598", "1.8E-05", "2.18E-08", "1.7E-03", "5.73", "7.38", "4.7",
     "4.34", "15000", "> 24", "5.7", "5.7", "25", "UNPUBLISHED FILE A", "1984"],
    ["6", "BENZENE", "000071-43-2", "C6H6", "78.11", "278.68", "353.24", "94.8", "2.29E-02", "5.55E-03", "2.13", "2.78", "2.13", "1.1", "223",
     "0.5", "0.04", "", "25", "UNPUBLISHED FILE C", "1989"],
    ["7", "ANTHRACENE", "000120-12-7", "C14H10", "178.23", "489.15", "613.05", "6.53E-06", "2.44E-07", "5.56E-05", "4.45", "7.55", "4.47",
     "3.45", "5.2", "", "1.3", "2.5", "25", "UNPUBLISHED FILE C", "1989"],
    ["8", "PHENOL", "000108-95-2", "C6H6O", "94.11", "314.05", "454.99", "0.35", "0.88", "3.33E-07", "1.46", "6.3", "1.43", "1.24", "15",
     "< 0.1", "0.01", "", "25", "UNPUBLISHED FILE C", "1989"],
    ["9", "MIREX", "002385-85-5", "C10CL12", "545.55", "758.15", "", "8.0E-07", "1.56E-10", "8.11E-04", "6.89", "9.0", "6.0", "4.31", "-999",
     "", "8-12", "", "25", "UNPUBLISHED FILE B", "1986"],
    ["10", "TOXAPHENE", "008001-35-2", "", "", "338-363", "", "6.69E-06", "1.3E-06", "6.0E-06", "5.90", "", "5.0", "4.52", "", "",
     "4-12", "", "25", "UNPUBLISHED FILE B", "1986"],
    ["11", "CARBON TETRACHLORIDE", "000056-23-5", "CCL4", "153.82", "250.2", "349.93", "115", "5.2E-03", "2.76E-02", "2.83", "2.79", "2.06",
     "1.48", "> 100000", "", "1", "", "25", "UNPUBLISHED FILE C", "1989"],
    ["12", "ENDRIN", "000072-20-8", "C12H8CL6O", "380.91", "508 (DECOMP.)", "", "3.0E-06", "6.56E-07", "6.36E-06", "-999", "8.13", "4.53",
     "3.28", "1.45", "", "14", "", "25", "UNPUBLISHED FILE A", "1984"],
]


def make():
    for row in ROWS:
        cas(row[2].lstrip("0"))
    assert all(len(row) == len(HEADER) for row in ROWS)
    check_numbers(ROWS)
    text = io.StringIO(newline="")
    csv.writer(text).writerows([HEADER, *ROWS])
    (FOLDER / "old-data.csv").write_bytes(text.getvalue().encode("ascii"))


if __name__ == "__main__":
    make()
