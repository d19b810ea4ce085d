"""What the scripts that make the inventories share: where files go, check digits, conversion, and fixed dates."""

import re
import shutil
import subprocess
import tempfile
import zipfile
from pathlib import Path

FOLDER = Path(__file__).resolve().parents[2] / "fixtures" / "inventories"
KINDS = FOLDER / "kinds"

# Every date that a writer puts into a file becomes this one.
WRITTEN = "2025-04-01T08:00:00Z"


def cas(number):
    """A CAS number, refused if its check digit is wrong, so that only the mistakes that are meant get into a file."""
    digits = number.replace("-", "")
    total = sum(place * int(digit) for place, digit in enumerate(reversed(digits[:-1]), 1))
    assert total % 10 == int(digits[-1]), f"{number}: check digit should be {total % 10}"
    return number


def ec(number):
    """An EC number, refused if its check digit is wrong."""
    digits = number.replace("-", "")
    total = sum(place * int(digit) for place, digit in enumerate(digits[:-1], 1)) % 11
    assert total == int(digits[-1]), f"{number}: check digit should be {total}"
    return number


def check_numbers(rows):
    """Checks every text of the rows that looks like a CAS or EC number on its own."""
    for row in rows:
        for value in row:
            if isinstance(value, str) and re.fullmatch(r"[1-9]\d{1,6}-\d\d-\d", value):
                cas(value)
            elif isinstance(value, str) and re.fullmatch(r"[2-9]\d\d-\d{3}-\d", value):
                ec(value)


def convert(source, kind, target):
    """Lets LibreOffice save a workbook as another kind (`xlsx`, `xls`, `ods`, a csv filter, ...)."""
    with tempfile.TemporaryDirectory() as folder:
        subprocess.run(
            ["soffice", f"-env:UserInstallation=file://{folder}/profile", "--headless", "--convert-to", kind,
             "--outdir", folder, str(source)],
            check=True, capture_output=True,
        )
        made = Path(folder) / f"{Path(source).stem}.{kind.split(':')[0]}"
        shutil.copyfile(made, target)


def settle(path):
    """Gives a zipped workbook fixed dates, so that making it again gives the same bytes."""
    with zipfile.ZipFile(path) as package:
        parts = [(entry.filename, entry.compress_type, package.read(entry)) for entry in package.infolist()]
    with zipfile.ZipFile(path, "w") as package:
        for name, compression, data in parts:
            if name in ("docProps/core.xml", "meta.xml"):
                text = data.decode("utf-8")
                text = re.sub(r"\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d(\.\d+)?Z?", WRITTEN, text)
                text = re.sub(r"<meta:editing-duration>[^<]*", "<meta:editing-duration>PT0S", text)
                data = text.encode("utf-8")
            entry = zipfile.ZipInfo(name, (2025, 4, 1, 8, 0, 0))
            entry.compress_type = compression
            entry.external_attr = 0o644 << 16
            package.writestr(entry, data)
