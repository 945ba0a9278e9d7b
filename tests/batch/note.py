# heatloom-batch note: the calculation note as text and as JSON.
# SPDX-License-Identifier: GPL-3.0-or-later
import json
import os

from tap import SOURCE, batch, main, plant, refused


def test_text_has_inputs_equations_numbers_and_sources():
    out, err = batch("note", plant("loop.heatloom"))
    assert err == ""
    for words in ("Calculation note", "\nPut in\n", "(given)", "(assumed; ", "\nFound, in the order of solving\n", "[definition of the isentropic efficiency; IAPWS-IF97",
                  "Carnot"):
        assert words in out, words
    assert "{" not in out


def test_every_example_has_a_note():
    place = os.path.join(SOURCE, "data", "examples")
    for name in sorted(os.listdir(place)):
        out, _ = batch("note", os.path.join(place, name))
        assert out.count("\n  [") > 50, name


def test_json_lines_carry_formula_and_terms():
    out, _ = batch("note", plant("loop.heatloom"), "--json", "-")
    note = json.loads(out)
    assert list(note) == ["inputs", "lines"] and len(note["inputs"]) > 5
    powers = [line for line in note["lines"] if line["terms"][line["result"]]["at"] == "P1.power"]
    assert len(powers) == 1
    line = powers[0]
    assert line["formula"] == "{4} = {0} × ({1} − {3})"
    flow, leaves, _, enters, power = line["terms"]
    assert abs(flow["value"] * (leaves["value"] - enters["value"]) - power["value"]) <= 1e-9 * power["value"]
    assert power["unit"] == "W" and power["origin"] == "found" and power["at"] == "P1.power"


def test_a_value_can_be_set():
    out, _ = batch("note", plant("loop.heatloom"), "--set", "T1.isentropic_efficiency=0.9")
    assert "isentropic efficiency of T1 = 0.900  (given)" in out


def test_mistakes():
    refused("note", status=2, says="PLANT")
    refused("note", "absent.heatloom", status=3, says="absent.heatloom")
    refused("note", plant("loop.heatloom"), "--set", "T1.colour=1", status=2, says="T1.colour")


main(globals())
