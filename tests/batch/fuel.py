# heatloom-batch fuel: the list, a fuel, its flue gas as a medium, and what it says to mistakes.
# SPDX-License-Identifier: GPL-3.0-or-later
import json
import re

from tap import batch, main, refused


def results(*arguments):
    return json.loads(batch("fuel", *arguments, "--json", "-")[0])


def test_without_a_word_the_fuels_are_listed():
    out, err = batch("fuel")
    rows = re.findall(r"^\| `([a-z-]+)` \| ([\d.]+) \| ([\d.]+) \| ([\d.]+) \| \S", out, re.MULTILINE)
    assert err == "" and len(rows) == out.count("\n") - 2 >= 20, out
    for name, lhv, hhv, _co2 in rows:
        assert float(lhv) <= float(hhv), name
        assert abs(results(name)["lhv_J_kg"] / 1e6 - float(lhv)) < 0.01, name


def test_a_fuel_is_burnt():
    out, _ = batch("fuel", "natural gas", "--excess-air", "10%")
    for words in ("Lower heating value", "48.16 MJ/kg", "Excess air", "10.0 %", "Adiabatic flame temperature", "Water dew point"):
        assert words in out, out
    assert "Acid dew point" not in out      # no sulphur
    assert "Acid dew point" in batch("fuel", "hard-coal", "--excess-air", "25%")[0]


def test_its_flue_gas_is_a_medium():
    burnt = results("methane", "--excess-air", "15 %")
    state = json.loads(batch("state", burnt["medium"], "p=1 bar", "T=150 °C", "--json", "-")[0])
    assert state["fluid"] == burnt["medium"] and state["phase"] == "gas"
    assert abs(sum(burnt["mole_fractions"].values()) - 1) < 1e-12
    wet = json.loads(batch("state", burnt["medium"], "p=1.01325 bar", f"T={burnt['water_dew_point_K'] - 273.15 - 1} °C", "--json", "-")[0])
    assert wet["phase"] == "two-phase" and wet["x"] < 1


def test_oxygen_measured_gives_the_excess():
    # By the rule of thumb excess = O2 / (21 - O2), a little less for gas.
    assert abs(results("hard-coal", "--oxygen", "6%")["excess_air"] - 6 / 15) < 0.02
    assert abs(results("natural-gas", "--oxygen", "3%")["excess_air"] - 3 / 18 * 0.9) < 0.02
    assert abs(results("natural-gas", "--oxygen", "3%")["oxygen_dry"] - 0.03) < 1e-12


def test_moisture_and_humid_air():
    dry, wet = results("wood-chips", "--moisture", "20%"), results("wood-chips", "--moisture", "50%")
    assert dry["lhv_J_kg"] > 1.7 * wet["lhv_J_kg"]
    humid = results("methane", "--air", "30 °C", "--humidity", "80%")
    assert humid["water_dew_point_K"] > results("methane")["water_dew_point_K"] and 0.02 < humid["humidity_ratio"] < 0.023
    hot = results("methane", "--air", "300 °C")
    assert hot["flame_T_K"] > results("methane")["flame_T_K"] + 150


def test_mistakes_are_refused():
    refused("fuel", "dilithium", status=2, says=["no fuel is called", "natural-gas"])
    refused("fuel", "methane", "--excess-air", "-5%", status=2, says="excess of air")
    refused("fuel", "methane", "--excess-air", "much", status=2, says="--excess-air much")
    refused("fuel", "methane", "--excess-air", "5%", "--oxygen", "3%", status=2, says="give one of them")
    refused("fuel", "methane", "--oxygen", "30%", status=2, says="not possible")
    refused("fuel", "methane", "--moisture", "10%", status=2, says="is a gas")
    refused("fuel", "methane", "--humidity", "120%", status=2, says="relative humidity")


main(globals())
