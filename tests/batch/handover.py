# What is handed over: the summary as CSV, the workbook, the drawing on paper, the report.
# SPDX-License-Identifier: GPL-3.0-or-later
import csv
import io
import json
import os
import re
import shutil
import subprocess
import time
import xml.etree.ElementTree as ElementTree
import zipfile

from tap import SOURCE, Skip, batch, main, plant, refused

DEMOS = ("ferry-lane", "linden-row", "tallow-fen")
SHEET = {"s": "http://schemas.openxmlformats.org/spreadsheetml/2006/main"}
RELATION = "{http://schemas.openxmlformats.org/officeDocument/2006/relationships}id"


def demo(name):
    return os.path.join(SOURCE, "data", "examples", f"{name}.heatloom")


def read_workbook(path):
    """Name of each sheet -> rows of cells, text or number, with the headings first; and the XML of each."""
    sheets, sources = {}, {}
    with zipfile.ZipFile(path) as archive:
        assert archive.testzip() is None
        strings = ["".join(part.text or "" for part in item.iter(f"{{{SHEET['s']}}}t"))
                   for item in ElementTree.fromstring(archive.read("xl/sharedStrings.xml"))]
        book = ElementTree.fromstring(archive.read("xl/workbook.xml"))
        for number, sheet in enumerate(book.find("s:sheets", SHEET), 1):
            assert sheet.get(RELATION) == f"rId{number}"
            root = ElementTree.fromstring(archive.read(f"xl/worksheets/sheet{number}.xml"))
            rows = {}
            for cell in root.iter(f"{{{SHEET['s']}}}c"):
                letters, row = re.fullmatch(r"([A-Z]+)(\d+)", cell.get("r")).groups()
                assert len(letters) == 1 and cell.find("s:f", SHEET) is None
                value = cell.find("s:v", SHEET)
                if value is not None:
                    rows.setdefault(int(row), {})[ord(letters) - ord("A")] = \
                        strings[int(value.text)] if cell.get("t") == "s" else float(value.text)
            sheets[sheet.get("name")] = [rows[n] for n in sorted(rows)]
            sources[sheet.get("name")] = root
    return sheets, sources


def test_the_summary_agrees_with_the_json():
    for name in DEMOS:
        found = json.loads(batch("solve", demo(name), "--json", "-")[0])["plant"]
        rows = list(csv.DictReader(io.StringIO(batch("solve", demo(name), "--summary", "-")[0], newline="")))
        assert all(list(row) == ["Group", "Quantity", "Value", "Unit", "Basis", "Key"] for row in rows)
        keys = [row["Key"] for row in rows]
        assert len(set(keys)) == len(keys) > 12, keys
        values = {row["Key"]: float(row["Value"]) * {"MW": 1e6, "kW": 1e3, "W": 1.0, "%": 0.01}.get(row["Unit"], 1.0) for row in rows}
        for key, same in (("net_power", "net_power_W"), ("gross_power", "gross_power_W"), ("own_consumption", "own_consumption_W"),
                          ("heat_input", "heat_input_W"), ("net_efficiency_lhv", "net_efficiency_lhv"), ("cooling_duty", "heat_rejected_W")):
            assert abs(values[key] - found[same]) <= 1e-9 * abs(found[same]), (name, key)
        # Every efficiency and heat rate says what it counts from.
        assert all(row["Basis"] for row in rows if row["Unit"] in ("%", "kJ/kWh")), rows


def test_the_workbook_holds_every_table_in_real_numbers():
    for name in DEMOS:
        batch("solve", demo(name), "--xlsx", "x.xlsx", "--csv", "x.csv", "--summary", "s.csv")
        sheets, sources = read_workbook("x.xlsx")
        usual = ["Performance", "Streams", "Components", "Heat exchange", "Exergy", "Given and assumed values", "Findings"]
        assert list(sheets) in (usual, usual + ["Variants"]), list(sheets)
        for root in sources.values():
            pane = root.find("s:sheetViews/s:sheetView/s:pane", SHEET)
            assert pane is not None and pane.get("state") == "frozen" and pane.get("ySplit") == "4"
        for sheet, path in (("Streams", "x.csv"), ("Performance", "s.csv")):
            with open(path, encoding="utf-8", newline="") as file:
                table = list(csv.reader(file))
            rows = sheets[sheet][2:]      # title and caution stand above
            assert len(rows) == len(table)
            for cells, line in zip(rows, table):
                for column, text in enumerate(line):
                    cell = cells.get(column, "")
                    if isinstance(cell, float):
                        assert abs(cell - float(text)) <= 1e-9 * abs(cell), (sheet, cell, text)
                    else:
                        assert cell == text, (sheet, cell, text)
            assert sum(isinstance(cell, float) for cells in rows for cell in cells.values()) > 10
        assert "Concept figures only" in sheets["Performance"][1][0]
        with open(demo(name), encoding="utf-8") as file:
            document = json.load(file)
        # A pair of rows above, then one for each value of the file, each with its source.
        values = sheets["Given and assumed values"][3:]
        n_values = sum(len(item.get("given", {})) + len(item.get("assumed", {})) + len(item.get("tied", {}))
                       for item in [document, *document["components"], *document["streams"]])
        assert len(values) >= n_values and all(cells[4] for cells in values), (len(values), n_values)


def test_the_workbook_is_the_same_bytes_each_time():
    contents = []
    for _ in range(2):
        batch("solve", plant("loop.heatloom"), "--xlsx", "x.xlsx")
        with open("x.xlsx", "rb") as file:
            contents.append(file.read())
        time.sleep(2.1)                   # the clock of archives ticks every two seconds
    assert contents[0] == contents[1]


def test_no_temporary_file_stays():
    os.mkdir("tmp")
    out, _ = batch("solve", plant("loop.heatloom"), "--xlsx", "-", text=False, env={"TMPDIR": os.path.abspath("tmp")})
    assert out.startswith(b"PK") and os.listdir("tmp") == []


def test_a_plant_that_is_not_solved_has_no_performance():
    with open(demo("ferry-lane"), encoding="utf-8") as file:
        document = json.load(file)
    document["streams"] = document["streams"][:-1]
    batch("solve", "-", "--xlsx", "x.xlsx", "--summary", "s.csv", stdin=json.dumps(document), status=1)
    sheets, _ = read_workbook("x.xlsx")
    assert len(sheets["Performance"]) == 3 and len(sheets["Findings"]) > 3
    with open("s.csv", encoding="utf-8", newline="") as file:
        assert len(list(csv.reader(file))) == 1


def test_names_of_other_scripts_and_long_ones():
    with open(demo("ferry-lane"), encoding="utf-8") as file:
        document = json.load(file)
    document["title"] = "محطة توليد 发电厂 <&> \"x\" " + 60 * "long "
    batch("solve", "-", "--xlsx", "x.xlsx", stdin=json.dumps(document))
    sheets, _ = read_workbook("x.xlsx")
    assert sheets["Streams"][0][0].startswith(document["title"])


def poppler(tool, *arguments):
    if shutil.which(tool) is None:
        raise Skip(f"there is no {tool}")
    return subprocess.run([tool, *arguments], capture_output=True, text=True, timeout=60, check=True).stdout


PAPERS = {"A4": (297, 210), "A3": (420, 297), "A2": (594, 420), "A1": (841, 594), "Letter": (279.4, 215.9), "Tabloid": (431.8, 279.4)}
CAUTION = "Concept figures only: not for construction, operation or purchase; local codes and licensed practice decide."


def test_every_drawing_fits_every_paper():
    for name in DEMOS:
        found = json.loads(batch("solve", demo(name), "--json", "-")[0])
        with open(demo(name), encoding="utf-8") as file:
            document = json.load(file)
        n_assumed = int(re.search(r"(\d+) values assumed", batch("solve", demo(name))[0])[1])
        for paper, (width, height) in PAPERS.items():
            if name != "tallow-fen" and paper not in ("A4", "A1"):
                continue                  # the largest plant on every paper, the others on the smallest and the largest
            batch("solve", demo(name), "--drawing", "x.pdf", "--paper", paper.lower(), "--field", "date=2026-12-01", "--field", "drawn=H. Weaver",
                  "--field", "checked=J. Reed", "--field", "case=100 % load", "--field", "variant=base", "--field", "revision=B")
            size = re.search(r"Page size:\s+([\d.]+) x ([\d.]+) pts", poppler("pdfinfo", "x.pdf"))
            assert abs(float(size[1]) - width / 25.4 * 72) < 0.6 and abs(float(size[2]) - height / 25.4 * 72) < 0.6, (paper, size[0])
            text = " ".join(poppler("pdftotext", "-layout", "x.pdf", "-").split())
            raw = " ".join(poppler("pdftotext", "-raw", "x.pdf", "-").split())
            for words in (document["title"], "2026-12-01", "H. Weaver", "J. Reed", "100 % load", "Approved", "Legend", "Performance", "flow [kg/s]"):
                assert words in text or words in raw, (name, paper, words)
            assert CAUTION in raw, (name, paper)
            # No figure, name or field of the sheet was cut.
            assert "…" not in text, (name, paper, text)
            assert f"{found['plant']['net_power_W'] / 1e6:.2f} MW" in text and f"{100 * found['plant']['cycle_efficiency']:.2f} %" in text
            assert f"Assumed values open {n_assumed} Findings {len(found['findings'])} " in raw, (name, paper, raw)
            fonts = poppler("pdffonts", "x.pdf").splitlines()[2:]
            assert fonts and all(line.split()[-5] == "yes" for line in fonts), fonts


def test_a_sheet_is_the_same_bytes_each_time_in_every_format():
    for ending, start in (("svg", b"<?xml"), ("pdf", b"%PDF-"), ("png", b"\x89PNG")):
        contents = []
        for _ in range(2):
            batch("solve", demo("ferry-lane"), "--drawing", f"x.{ending}", "--paper", "A4")
            with open(f"x.{ending}", "rb") as file:
                contents.append(file.read())
        assert contents[0] == contents[1] and contents[0].startswith(start), ending


def test_the_scale_is_kept_or_refused():
    batch("solve", demo("tallow-fen"), "--drawing", "x.pdf", "--paper", "A3", "--scale", "0.5")
    assert "A3 · 0.50" in poppler("pdftotext", "x.pdf", "-")
    refused("solve", demo("tallow-fen"), "--drawing", "x.svg", "--paper", "A4", "--scale", "3", status=2, says=["--scale", "larger than a sheet of A4"])


def test_mistakes_of_the_sheet_are_named():
    loop = plant("loop.heatloom")
    refused("solve", loop, "--drawing", "x.pdf", "--paper", "A9", status=2, says=["A9", "A4, A3, A2, A1, Letter, Tabloid"])
    refused("solve", loop, "--paper", "A4", status=2, says="--drawing")
    refused("solve", loop, "--drawing", "x.pdf", "--scale", "1", status=2, says="--paper")
    refused("solve", loop, "--drawing", "x.pdf", "--paper", "A4", "--scale", "big", status=2, says="big")
    refused("solve", loop, "--drawing", "x.pdf", "--paper", "A4", "--field", "author=x", status=2, says=["author", "approved"])
    refused("solve", loop, "--drawing", "x.pdf", "--paper", "A4", "--field", "date", status=2, says="NAME=TEXT")


def pages_of(path):
    """The words of each page, white space made one blank."""
    return [" ".join(page.split()) for page in poppler("pdftotext", "-layout", path, "-").split("\f")[:-1]]


def test_the_contents_of_the_report_name_the_right_pages():
    for name in DEMOS:
        batch("solve", demo(name), "--report", "x.pdf")
        pages = pages_of("x.pdf")
        assert int(re.search(r"Pages:\s+(\d+)", poppler("pdfinfo", "x.pdf"))[1]) == len(pages) > 8
        entries = re.findall(r"(\d+) ([A-Z][^.\d]+?) (\d+)(?= |$)", pages[1].split("Contents", 1)[1].split("Concept figures")[0])
        n_sections = 14 if any(title == "Variants" for _, title, _ in entries) else 13
        assert [int(number) for number, _, _ in entries] == list(range(1, n_sections + 1)), (name, entries)
        for number, title, page in entries:
            sheet = pages[int(page) - 1]
            assert title in sheet if title == "Heat balance drawing" else f"{number} {title}" in sheet, (name, number, title, page)
        # Each lies where its link leads, and in the bookmarks.
        places = re.findall(r'^\s*(\d+) .*"section(\d+)"$', poppler("pdfinfo", "-dests", "x.pdf"), re.MULTILINE)
        assert {int(n) + 1: int(page) for page, n in places} == {int(number): int(page) for number, _, page in entries}, places
        with open("x.pdf", "rb") as file:
            content = file.read()
        assert b"/Outlines" in content and content.count(b"/Subtype /Link") == n_sections
        assert all(f"{n} / {len(pages)}" in page for n, page in enumerate(pages, 1) if n not in (1, int(entries[1][2])))


def test_the_report_holds_what_was_found():
    for name in DEMOS:
        found = json.loads(batch("solve", demo(name), "--json", "-")[0])
        with open(demo(name), encoding="utf-8") as file:
            document = json.load(file)
        batch("solve", demo(name), "--report", "x.pdf", "--csv", "x.csv", "--field", "date=2026-12-01", "--field", "approved=J. Reed")
        pages = pages_of("x.pdf")
        raw = [" ".join(page.split()) for page in poppler("pdftotext", "-raw", "x.pdf", "-").split("\f")[:-1]]
        whole = " ".join(raw)
        assert document["title"] in raw[0].replace("- ", "") and "2026-12-01" in raw[0] and "J. Reed" in raw[0] and "Caution" in raw[0]
        # The caution is on every page: in the foot, or whole on the cover and in the title block.
        assert all("Concept figures only" in page for page in raw[1:]) and "licensed practice decide" in raw[0]
        for component in document["components"]:
            assert f"{component['id']} " in whole and component.get("name", "") in whole, component["id"]
        for finding in found["findings"]:
            assert finding["at"] in whole and finding["text"][:25] in whole, finding
        streams = next(page for page in pages if "5 Streams" in page and "Contents" not in page)
        with open("x.csv", encoding="utf-8", newline="") as file:
            for row in list(csv.reader(file))[1:]:
                assert f" {row[1]} {row[2]} " in streams, row
        assert whole.count("☐") == int(re.search(r"(\d+) values assumed", batch("solve", demo(name))[0])[1])
        assert "heat rate of the plant = heat input of the plant ÷ gross power of the plant" in whole
        fonts = poppler("pdffonts", "x.pdf").splitlines()[2:]
        assert fonts and all(line.split()[-5] == "yes" and line.split()[-3] == "yes" for line in fonts), fonts    # embedded, and read as text
        info = poppler("pdfinfo", "x.pdf")
        assert f"{document['title']}: Heat balance report" in info and "Heatloom" in info


def test_the_report_is_the_same_bytes_each_time():
    contents = []
    for _ in range(2):
        batch("solve", demo("linden-row"), "--report", "x.pdf", "--field", "drawn=HW")
        with open("x.pdf", "rb") as file:
            contents.append(file.read())
        time.sleep(1.1)
    assert contents[0] == contents[1]


def test_papers_of_the_report():
    for paper, drawing, page in (("A1", (841, 594), (210, 297)), ("Tabloid", (431.8, 279.4), (215.9, 279.4))):
        batch("solve", demo("ferry-lane"), "--report", "x.pdf", "--paper", paper)
        sizes = re.findall(r"Page\s+\d+ size:\s+([\d.]+) x ([\d.]+)", poppler("pdfinfo", "-l", "99", "x.pdf"))
        in_mm = [(float(width) / 72 * 25.4, float(height) / 72 * 25.4) for width, height in sizes]
        for there, expected in ((in_mm[0], page), (in_mm[3], drawing)):
            assert all(abs(a - b) < 0.3 for a, b in zip(there, expected)), (paper, there)


def test_the_report_of_a_plant_that_is_not_solved():
    with open(demo("tallow-fen"), encoding="utf-8") as file:
        document = json.load(file)
    document["streams"] = document["streams"][:-1]
    document["title"] = "محطة توليد 发电厂 " + 30 * "a long name "
    document["components"][0]["name"] = 40 * "verylongword"
    batch("solve", "-", "--report", "x.pdf", stdin=json.dumps(document), status=1)
    text = " ".join(pages_of("x.pdf"))
    assert "The plant is not solved: it has no performance." in text and "发电厂" in text
    batch("solve", "-", "--report", "x.pdf", stdin='{"heatloom": 1, "components": [], "streams": []}')
    assert "Plant without a title" in " ".join(pages_of("x.pdf"))


def test_the_report_is_quick():
    for name in DEMOS:
        start = time.monotonic()
        batch("solve", demo(name), "--report", "x.pdf")
        assert time.monotonic() - start < 3.0, name      # 0.4 s on an idle machine of 2023; twice the aim, for busy ones


def test_files_that_cannot_be_written():
    for option in ("--summary", "--xlsx", "--report"):
        refused("solve", plant("loop.heatloom"), option, "/nowhere/at/all/x", status=3, says="/nowhere/at/all/x")


main(globals())
