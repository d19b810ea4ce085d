"""Writes a sheet with the npm package `xlsx`, which has cells of every type in xls and xlsb."""

import datetime
import json
import subprocess
from pathlib import Path

from common import settle

# The numbers that the binary kinds store for errors.
CODES = {"#DIV/0!": 7, "#VALUE!": 15, "#REF!": 23, "#NAME?": 29, "#NUM!": 36, "#N/A": 42}


def cell(value):
    if value is None:
        return None
    if isinstance(value, bool):
        return {"t": "b", "v": value}
    if isinstance(value, (int, float)):
        return {"t": "n", "v": value}
    if isinstance(value, datetime.datetime):
        return {"t": "n", "v": serial(value), "z": "yyyy-mm-dd hh:mm:ss"}
    if isinstance(value, datetime.date):
        return {"t": "n", "v": serial(datetime.datetime(value.year, value.month, value.day)), "z": "yyyy-mm-dd"}
    if value in CODES:
        return {"t": "e", "v": CODES[value], "w": value}
    return {"t": "s", "v": value}


def serial(moment):
    return (moment - datetime.datetime(1899, 12, 30)).total_seconds() / 86400


def write(path, name, rows):
    cells = json.dumps([[cell(value) for value in row] for row in rows])
    script = Path(__file__).with_name("sheetjs.cjs")
    subprocess.run(["node", str(script), str(path), name], input=cells, text=True, check=True)
    if Path(path).suffix == ".xlsb":
        settle(path)
