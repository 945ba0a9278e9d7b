# heatloom-batch variants, and --variant of the other commands.
# SPDX-License-Identifier: GPL-3.0-or-later
import csv
import json
import os
import shutil
import subprocess
import zipfile

from tap import SOURCE, Skip, batch, main, refused

TALLOW = os.path.join(SOURCE, "data", "examples", "tallow-fen.heatloom")
ADDED = [{"set": "B1.steam.m", "to": 20.0}, {"set": "U1.steam.m", "to": None}, {"set": "U1.heat", "to": 9e6}]


def rows(*arguments, status=0):
    out, _ = batch("variants", *arguments, "--csv", "-", status=status)
    table = list(csv.reader(out.splitlines()))
    return table[0], {row[1]: row for row in table[1:]}


def changed(edit):
    """Tallow Fen with its file changed."""
    with open(TALLOW, encoding="utf-8") as file:
        plant = json.load(file)
    edit(plant)
    with open("changed.heatloom", "w", encoding="utf-8") as file:
        json.dump(plant, file)
    return "changed.heatloom"


def solved(*arguments):
    return json.loads(batch("solve", *arguments, "--json", "-")[0])


def test_table_says_what_solve_says():
    heading, table = rows(TALLOW)
    assert heading == ["Group", "Quantity", "Unit", "Base", "river cooling", "river cooling – Base"]
    base, river = solved(TALLOW), solved(TALLOW, "--variant", "river cooling")
    gross = table["Gross power"]
    for cell, solution in ((gross[3], base), (gross[4], river)):
        assert abs(float(cell) * 1e6 / solution["plant"]["gross_power_W"] - 1) < 1e-9, gross
    assert abs(float(gross[5]) - (float(gross[4]) - float(gross[3]))) < 1e-6
    assert table["terminal temperature difference of C1"][0] == "Changed"
    assert [float(cell) for cell in table["temperature of Y1"][3:5]] == [24.0, 12.0]
    assert table["Findings"][3:5] == ["1 caution", "1 warning"]


def test_river_cooling_is_what_was_balanced_beforehand():
    # The better vacuum: 33.6 mbar, 13.75 MW gross, and an exhaust so wet that it is warned of; balanced by hand with IAPWS-IF97.
    river = solved(TALLOW, "--variant", "river cooling")
    exhaust = river["streams"]["3"]
    assert abs(exhaust["p_Pa"] - 3360) < 10 and abs(exhaust["x"] - 0.866) < 0.0015, exhaust
    assert abs(river["plant"]["gross_power_W"] - 13.75e6) < 0.05e6
    assert any(finding["grade"] == "warning" for finding in river["findings"])


def test_reference_turns_the_differences():
    heading, table = rows(TALLOW, "--reference", "river cooling")
    assert heading[5] == "Base – river cooling"
    assert float(table["Gross power"][5]) < -0.5


def test_equal_duty_gives_the_reference_s_flows_and_heats():
    def edit(plant):
        plant["variants"].append({"name": "more steam", "changes": ADDED})
    file = changed(edit)
    free, equal = rows(file)[1], rows(file, "--equal-duty")[1]
    assert abs(float(free["Live steam"][5]) - 20) < 1e-6
    assert abs(float(equal["Live steam"][5]) - 16.6666666667) < 1e-6
    assert [float(cell) for cell in equal["mass flow at steam outlet of B1"][3:6]] == [float(equal["Live steam"][3])] * 3
    # The variant gives the user's heat instead of its flow: both are one too many, so an assumed value makes room, and a note names it.
    assert equal["mass flow at steam inlet of U1"][0] == "Duty"
    notes = [name for name, row in equal.items() if row[0] == "Note"]
    assert len(notes) == 1 and notes[0].startswith("more steam: at equal duty ") and notes[0].endswith(" is now found"), notes


def test_changes_that_do_not_apply_are_told():
    def edit(plant):
        plant["variants"][0]["changes"].append({"set": "X7.power", "to": 1})
    file = changed(edit)
    _, table = rows(file)
    assert any("the change of X7.power does not apply" in name for name in table)
    _, err = batch("solve", file, "--variant", "river cooling")
    assert "heatloom-batch: river cooling: the change of X7.power does not apply: " in err and "there is no component “X7”" in err


def test_a_variant_without_a_solution_ends_with_status_1():
    def edit(plant):
        plant["variants"].append({"name": "no power", "changes": [{"set": "B1.steam.T", "to": None}]})
    _, table = rows(changed(edit), status=1)
    assert any(name.startswith("no power has no solution: ") for name in table)
    assert table["Gross power"][5] == ""


def test_other_commands_take_a_variant():
    note, _ = batch("note", TALLOW, "--variant", "river cooling")
    assert "285.15" in note or "12.0 °C" in note
    out, _ = batch("check", TALLOW, "--variant", "river cooling")
    assert "blades erode" in out
    _, _ = batch("check", TALLOW, "--variant", "river cooling", "--strict", status=1)
    river = solved(TALLOW, "--variant", "river cooling", "--set", "Y1.outlet.T=20 °C")
    assert abs(river["streams"]["19"]["T_K"] - 293.15) < 1e-6


def test_workbook_and_report_hold_the_variants():
    batch("solve", TALLOW, "--xlsx", "tables.xlsx", "--report", "report.pdf")
    with zipfile.ZipFile("tables.xlsx") as book:
        assert 'name="Variants"' in book.read("xl/workbook.xml").decode()
        assert "river cooling – Base" in book.read("xl/sharedStrings.xml").decode()
    if shutil.which("pdftotext") is None:
        raise Skip("there is no pdftotext")
    text = subprocess.run(["pdftotext", "-layout", "report.pdf", "-"], capture_output=True, text=True, check=True).stdout
    assert "What each variant changes" in text and "exhaust pressure of T1" in text
    batch("solve", os.path.join(SOURCE, "tests", "batch", "plants", "loop.heatloom"), "--xlsx", "plain.xlsx")
    with zipfile.ZipFile("plain.xlsx") as book:
        assert "Variants" not in book.read("xl/workbook.xml").decode()


def test_a_ghost_lies_beneath_the_diagram():
    batch("solve", TALLOW, "--variant", "river cooling", "--diagram", "ts", "plain.svg")
    batch("solve", TALLOW, "--variant", "river cooling", "--diagram", "ts", "with.svg", "--ghost", "base")
    batch("solve", TALLOW, "--variant", "river cooling", "--diagram", "ts", "again.svg", "--ghost", "base")
    with open("plain.svg", "rb") as plain, open("with.svg", "rb") as ghost, open("again.svg", "rb") as again:
        drawn = ghost.read()
        assert len(drawn) > len(plain.read())        # processes and states of another cycle
        assert drawn == again.read()
    refused("solve", TALLOW, "--diagram", "ts", "x.svg", "--ghost", "lake", status=2, says=["--ghost", "no variant “lake”"])


def test_a_plant_without_variants_is_a_table_of_one():
    heading, table = rows(os.path.join(SOURCE, "tests", "batch", "plants", "loop.heatloom"))
    assert heading == ["Group", "Quantity", "Unit", "Base"]
    assert "Net power" in table


def test_mistakes():
    refused("variants", status=2, says="PLANT")
    refused("variants", "absent.heatloom", status=3, says="absent.heatloom")
    refused("variants", TALLOW, "--reference", "lake", status=2, says=["no variant “lake”", "“river cooling”"])
    refused("solve", TALLOW, "--variant", "lake", status=2, says="no variant “lake”")
    refused("solve", os.path.join(SOURCE, "tests", "batch", "plants", "loop.heatloom"), "--variant", "lake", status=2, says="has no variants")


main(globals())
