"""A stock list from the Netherlands (XlsxWriter): formulas with their results, number formats that show percentages and
units, a table with a filter, a frozen header, a hidden sheet of prices."""

import datetime

import xlsxwriter

from common import FOLDER, check_numbers, settle

HEADER = [
    "Artikelnr.", "Stofnaam", "CAS-nummer", "EG-nummer", "Leverancier", "Gehalte", "Aantal vaten", "Vatinhoud (kg)",
    "Jaarverbruik (ton/jaar)", "Molmassa (g/mol)", "Smeltpunt (°C)", "Kookpunt (°C)", "Dampspanning bij 20 °C (Pa)",
    "Oplosbaarheid in water (g/l)", "log Kow", "BCF (l/kg)", "Halfwaardetijd bodem (dagen)", "Halfwaardetijd zoet water",
    "Halfwaardetijd sediment", "Halfwaardetijd lucht (uur)", "Gemakkelijk biologisch afbreekbaar",
    "H-zinnen", "Laatst gewijzigd", "Prijs per kg (€)",
]
DAY = datetime.date
# Drums and kilograms a drum give the tonnes, as a formula: =G*H/1000.
ROWS = [
    [4001, "Xyleen (mengsel van isomeren)", "1330-20-7", "215-535-7", "Verfhandel De Roos", 0.995, 24, 180, 106.16, -47.9, 139,
     821, 0.175, 3.16, 25.9, 23, 3, None, 13, 0.88, "H226, H304, H312+H332, H315, H319, H335, H373", DAY(2024, 11, 4), 1.85],
    [4002, "n-Butylacetaat", "123-86-4", "204-658-1", "Verfhandel De Roos", 0.99, 12, 180, 116.16, -77, 126, 1200, 5.3, 2.3, 15.3,
     None, None, None, 92, 0.83, "H226, H336", DAY(2024, 11, 4), 1.4],
    [4003, "Dimethyldisulfide", "624-92-0", "210-871-0", "Chemie Waal", 0.985, 2, 50, 94.2, -84.7, 109.7, 2930, 2.7, 1.91, "8,5",
     12, None, None, 2, 0.1, "H225, H301, H317, H319, H331, H370, H410", DAY(2023, 2, 8), 9.1],
    [4004, "Tributylfosfaat", "126-73-8", "204-800-2", "Chemie Waal", 0.5, 3, 200, 266.31, -70, 289, 0.15, 0.28, 4, "20-35", 14, 2,
     4, 4.9, 0.89, "H302, H315, H351", DAY(2023, 2, 8), 4.2],
    [4005, "Decamethylcyclopentasiloxaan", "541-02-6", "208-764-9", "Silicoon Maas", 0.999, 1, 190, 370.77, -38, 211, 33.2, 0.000017,
     8.023, 7060, 12.6, 10, 171, 165, 0.0014, "geen", DAY(2022, 6, 1), 3.3],
    [4006, "Fipronil", "120068-37-3", "424-610-5", "Agro IJssel", 0.8, 1, 5, 437.15, 203, None, 0.000002, 0.00378, 3.75, 321, 142, 8,
     26, 5.5, 0.47, "H301, H311, H331, H372, H410", DAY(2022, 6, 1), 120],
    [4007, "Fosforzuur", "7664-38-2", "231-633-2", "Chemie Waal", 0.85, 40, 35, 98, 42.4, 158, 4, "mengbaar", "n.v.t.", None, None, None,
     None, None, None, "H290, H302, H314", DAY(2024, 1, 19), 0.95],
    [4008, "Oleïnezuur", "112-80-1", "204-007-1", "Oliehuis Linge", 0.75, 6, 180, 282.46, 13.4, 360, 0.0000728, "onoplosbaar", 7.64, 10,
     None, None, None, 1.7, 0.78, "niet ingedeeld", DAY(2024, 1, 19), 1.1],
    [4009, "2-Fenoxyethanol", "122-99-6", "204-589-7", "Oliehuis Linge", 0.01, 2, 200, 138.16, 11.5, 245, 1.3, 24, 1.2, 0.35, 1, None,
     None, 11.8, 0.9, "H302, H318, H335", DAY(2024, 1, 19), 2.05],
    [4010, "Methylparabeen", "99-76-3", "202-785-7", "Oliehuis Linge", 0.002, 1, 25, 152.15, 126, 275, 0.0315, 2.5, 1.96, None, None, 1,
     None, 28, 0.92, "H412", DAY(2021, 10, 5), 7.75],
    [4011, "Perfluorhexaanzuur", "307-24-4", "206-196-6", "Fluor Rijn", 0.97, 1, 1, 314.05, 14, 157, 264, "15,7", "circa 3,5", None, "> 365",
     None, None, None, 0.02, "H314", DAY(2021, 10, 5), 410],
    [4012, "Citroenzuur", "77-92-9", "201-069-1", "Oliehuis Linge", 1, 30, 25, 192.12, 153, None, 0.0000005, 590, -1.72, 3.2, None, None,
     None, 16, 0.97, "H319, H335", DAY(2021, 10, 5), 0.9],
]
TONNES = [4.32, 2.16, 0.1, 0.6, 0.19, 0.005, 1.4, 1.08, 0.4, 0.025, 0.001, 0.75]


def make():
    check_numbers(ROWS)
    path = FOLDER / "dutch-stock.xlsx"
    book = xlsxwriter.Workbook(path)
    book.set_properties({"created": datetime.datetime(2025, 4, 1, 8)})
    bold = book.add_format({"bold": True, "bg_color": "#DDEBF7", "text_wrap": True})
    percent = book.add_format({"num_format": "0.0%"})
    whole_percent = book.add_format({"num_format": "0%"})
    days = book.add_format({"num_format": '0.0" d"'})
    weeks = book.add_format({"num_format": '0" weken"'})
    date = book.add_format({"num_format": "dd-mm-yyyy"})
    euro = book.add_format({"num_format": '€ #,##0.00'})
    sheet = book.add_worksheet("Voorraad")
    sheet.write_row(0, 0, HEADER, bold)
    for index, (row, tonnes) in enumerate(zip(ROWS, TONNES, strict=True), 1):
        full = row[:8] + [tonnes] + row[8:]
        assert len(full) == len(HEADER)
        for column, value in enumerate(full):
            if value is None:
                continue
            if column == 8:
                sheet.write_formula(index, 8, f"=G{index + 1}*H{index + 1}/1000", None, value)
            elif column == 5:
                sheet.write_number(index, column, value, percent)
            elif column == 20 and isinstance(value, float):
                sheet.write_number(index, column, value, whole_percent)
            elif column == 17 and not isinstance(value, str):
                sheet.write_number(index, column, value, days)
            elif column == 18:
                sheet.write_number(index, column, value, weeks)
            elif isinstance(value, datetime.date):
                sheet.write_datetime(index, column, datetime.datetime.combine(value, datetime.time()), date)
            elif column == 23:
                sheet.write_number(index, column, value, euro)
            else:
                sheet.write(index, column, value)
    sheet.freeze_panes(1, 2)
    sheet.autofilter(0, 0, len(ROWS), len(HEADER) - 1)
    prices = book.add_worksheet("Prijzen")
    prices.write_row(0, 0, ["Leverancier", "Korting"])
    prices.write_row(1, 0, ["Chemie Waal", 0.05])
    prices.hide()
    book.close()
    settle(path)


if __name__ == "__main__":
    make()
