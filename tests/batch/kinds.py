# heatloom-batch kinds and fluids, and docs/components.md that is made from it.
# SPDX-License-Identifier: GPL-3.0-or-later
import os
import re

from tap import SOURCE, batch, main, refused

KINDS = ("heat_input", "boiler", "turbine", "generator", "condenser", "pump", "pipe", "valve", "open_heater",
         "closed_heater", "splitter", "mixer", "steam_user", "make_up", "boundary", "motor", "gearbox", "compressor", "desuperheater", "moisture_separator", "flash_vessel", "cooling_tower", "air_condenser", "district_heater", "recuperator", "exchanger",
         "feed_pump_turbine", "ejector", "gland_seal", "control_stage", "hotwell", "header", "bypass_station", "drain_pump",
         "expander", "evaporator", "expansion_valve",
         "gas_source", "superheater", "reheater", "evaporator_drum", "economiser", "air_preheater", "steam_air_heater", "flue_gas_condenser",
         "fan", "stack", "solar_field")


def test_every_kind_is_there():
    out, err = batch("kinds")
    assert err == ""
    for kind in KINDS:
        assert f"`{kind}`" in out, kind
    for key in ("`isentropic_efficiency`", "`extractionN.p`", "`net_power`", "`cycle_efficiency`", "`m`"):
        assert key in out, key


def test_tables_are_whole():
    out, _ = batch("kinds")
    width = None
    for line in out.splitlines():
        if line.startswith("|"):
            bars = line.replace("\\|", "").count("|")
            assert width in (None, bars), line
            width = bars
        else:
            width = None


def test_media_are_compared_and_sorted():
    out, err = batch("fluids", "--source", "120 °C", "--sink", "15 °C")
    rows = [[cell.strip() for cell in line.split("|")[1:-1]] for line in out.splitlines()[2:]]
    efficiencies = [float(row[7].split()[0]) for row in rows if "%" in row[7]]
    assert err == "" and len(rows) > 35 and len(efficiencies) > 20, out
    assert efficiencies == sorted(efficiencies, reverse=True), efficiencies
    isopentane = next(row for row in rows if "`isopentane`" in row[0])
    assert isopentane[2:4] == ["dry", "A3"] and isopentane[4] == "8.905 bar", isopentane
    assert "source too hot" in next(line for line in out.splitlines() if "`carbon-dioxide`" in line)
    refused("fluids", "--source", "120 °C", status=2, says=["--sink"])
    refused("fluids", "--source", "120 bar", "--sink", "20 °C", status=2, says=["--source", "bar"])


def test_every_medium_is_listed_and_answers():
    out, err = batch("fluids")
    rows = re.findall(r"^\| `([^`]+)` .*\| (\S+) °C to \S+ °C \|.*\| (\S+) °C, ", out, re.MULTILINE)
    gases = re.findall(r"^\| `([^`]+)` .*\| has no dome \|$", out, re.MULTILINE)
    ids = [row[0] for row in rows] + gases
    assert gases[-2:] == ["air", "flue-gas"] and {"mineral-oil", "calcium-chloride-20"} < set(gases), gases
    for gas in gases:
        assert "kJ/kg" in batch("state", gas, "p=1 bar", "T=50 °C")[0], gas
    assert err == "" and "water" in ids and len(ids) == len(set(ids)) == out.count("\n") - 2 > 30, ids
    for medium, coldest, critical in rows:
        middle = (float(coldest) + float(critical)) / 2
        assert "kJ/kg" in batch("state", medium, f"T={middle} °C", "x=0.5")[0], medium


def test_a_gas_of_ones_own_answers_or_says_why():
    out, _ = batch("state", "gas:N2=0.75,CO2=0.08,H2O=0.1,O2=0.07", "p=1 bar", "T=40 °C")
    assert "two-phase" in out, out
    _, err = batch("state", "gas:N2=0.8,XY=0.2", "p=1 bar", "T=40 °C", status=2)
    assert 'species "XY" is not known; known are N2' in err, err


def test_the_page_in_docs_is_this_one():
    # When this fails: build/src/batch/heatloom-batch kinds > docs/components.md
    out, _ = batch("kinds")
    with open(os.path.join(SOURCE, "docs", "components.md"), encoding="utf-8") as page:
        assert page.read() == out, "docs/components.md is old; make it anew: heatloom-batch kinds > docs/components.md"


main(globals())
