# heatloom-batch solve and check: results, the JSON contract, files, and what is said to mistakes.
# SPDX-License-Identifier: GPL-3.0-or-later
import csv
import io
import json
import os
import re
import xml.etree.ElementTree as ElementTree

from tap import SOURCE, batch, main, plant, refused

STREAM_KEYS = ["m_kg_s", "p_Pa", "T_K", "h_J_kg", "s_J_kgK", "e_J_kg", "x"]


def solved(*options, name="loop.heatloom", status=0):
    out, _ = batch("solve", plant(name), "--json", "-", *options, status=status)
    return json.loads(out)


def edited(**changes):
    """The text of the loop with replacements."""
    with open(plant("loop.heatloom"), encoding="utf-8") as file:
        text = file.read()
    for old, new in changes.get("replace", []):
        assert old in text, old
        text = text.replace(old, new)
    return text


def close(value, expected, relative=1e-9):
    assert abs(value - expected) <= relative * abs(expected), f"{value!r} is not {expected!r}"


def test_sensitivity_is_a_table_sorted_by_effect():
    out, _ = batch("solve", plant("loop.heatloom"), "--sensitivity", "plant.net_efficiency_lhv")
    table = out.split("Effect on ")[1]
    assert table.startswith("net efficiency (lhv) of the plant (") or table.lower().startswith("net efficiency (lhv)"), table
    effects = [abs(float(row.split()[-2])) for row in table.splitlines()[1:] if row.endswith(" %")]
    assert len(effects) >= 5 and effects == sorted(effects, reverse=True) and effects[0] > 0.1, effects
    # Against a second solution: 1 % of the isentropic efficiency.
    row = [row for row in table.splitlines() if "isentropic efficiency of T1" in row][0]
    before, more = solved()["plant"]["net_efficiency_lhv"], solved("--set", "T1.isentropic_efficiency=0.838300")["plant"]["net_efficiency_lhv"]
    assert abs(float(row.split()[-2]) - 100 * (more / before - 1)) < 2e-3, (row, before, more)


def test_sensitivity_of_what_is_not_there():
    refused("solve", plant("loop.heatloom"), "--sensitivity", "plant.colour", status=2, says=["--sensitivity", "colour"])


def test_json_has_the_members_of_the_contract():
    found = solved()
    assert list(found) == ["solved", "plant", "streams", "components", "performance", "exchangers", "exergy", "findings", "yielded"], list(found)
    assert found["solved"] is True and found["yielded"] == []
    assert list(found["streams"]) == ["1", "2", "3", "4"] and list(found["components"]) == ["B1", "T1", "C1", "P1"]
    for stream in found["streams"].values():
        assert list(stream) == STREAM_KEYS
    for finding in found["findings"]:
        assert set(finding) - {"source"} == {"grade", "code", "text", "at", "mends"}, finding
        assert finding["grade"] in ("hint", "caution", "warning") and isinstance(finding["mends"], list)


def test_exergy_comes_in_and_is_made_lost_or_destroyed():
    found = solved()
    incoming = ("fuel", "heat", "stream_in", "cold", "electricity")
    assert {flow["what"] for flow in found["exergy"]} >= {"heat", "destruction", "net"}, found["exergy"]
    came = sum(flow["power_W"] for flow in found["exergy"] if flow["what"] in incoming)
    went = sum(flow["power_W"] for flow in found["exergy"] if flow["what"] not in incoming)
    close(came, went)
    close(found["plant"]["exergy_input_W"], came)
    destroyed = {flow["at"]: flow["power_W"] for flow in found["exergy"] if flow["what"] == "destruction"}
    close(destroyed["T1"], found["components"]["T1"]["exergy_destruction_W"])
    close(found["plant"]["exergy_efficiency"], found["plant"]["exergy_product_W"] / came)
    live, exhaust = (found["streams"][id] for id in "12")
    turbine = found["components"]["T1"]
    close(turbine["exergy_fuel_W"], live["m_kg_s"] * (live["e_J_kg"] - exhaust["e_J_kg"]))
    close(turbine["exergy_product_W"], turbine["power_W"])


def test_performance_and_exchangers_are_in_the_json():
    found = solved()
    performance = found["performance"]
    close(performance["net_power_W"], found["plant"]["net_power_W"])
    live, exhaust, condensate, _ = (found["streams"][id] for id in "1234")
    # One section: the engine efficiency is that of the section, as far as shaft and generator lose nothing beside.
    drop = live["h_J_kg"] - exhaust["h_J_kg"]
    close(performance["engine_efficiency"] / (drop * performance["steam_rate_theoretical_kg_J"]), found["components"]["T1"]["mechanical_efficiency"])
    for exchanger in found["exchangers"].values():
        close(sum(zone["heat_W"] for zone in exchanger["zones"]), exchanger["heat_W"])
        for zone in exchanger["zones"]:
            close(zone["UA_W_K"] * zone["mean_difference_K"], zone["heat_W"])
        assert exchanger["hot"][0][0] == 0 and exchanger["cold"][0][0] == 0
        assert all(after[0] >= before[0] for before, after in zip(exchanger["hot"], exchanger["hot"][1:]))


def test_json_numbers_are_those_of_the_plant():
    found = solved()
    close(found["plant"]["net_power_W"], 10e6, 1e-12)
    live, exhaust, condensate, feed = (found["streams"][id] for id in "1234")
    close(live["T_K"], 753.15, 1e-12)
    close(live["p_Pa"], 8e6, 1e-12)
    assert live["x"] is None and 0.7 < exhaust["x"] < 1.0
    # First law, from the streams alone; every term is in the file.
    heat = live["m_kg_s"] * (live["h_J_kg"] - feed["h_J_kg"])
    close(found["plant"]["heat_input_W"], heat)
    close(found["components"]["C1"]["heat_W"], live["m_kg_s"] * (exhaust["h_J_kg"] - condensate["h_J_kg"]))
    turbine = live["m_kg_s"] * (live["h_J_kg"] - exhaust["h_J_kg"])
    close(found["components"]["T1"]["internal_power_W"], turbine)
    close(found["components"]["P1"]["power_W"], live["m_kg_s"] * (feed["h_J_kg"] - condensate["h_J_kg"]))
    assert 0.2 < found["plant"]["cycle_efficiency"] < 0.4


def test_a_state_is_the_same_from_state_and_solve():
    live = solved()["streams"]["1"]
    one = json.loads(batch("state", "water", "p=80 bar", "T=480 °C", "--json", "-")[0])
    close(live["h_J_kg"], one["h_J_kg"])
    close(live["s_J_kgK"], one["s_J_kgK"])


def test_text_is_for_people():
    out, err = batch("solve", plant("loop.heatloom"))
    assert err == "" and out.startswith("Four parts\n")
    assert "10.0" in out and "MW" in out and "%" in out, out


def test_set_takes_units_and_changes_the_result():
    before = solved()
    after = solved("--set", "T1.inlet.p=60 bar", "--set", "plant.net_power=12.5 MW")
    close(after["streams"]["1"]["p_Pa"], 60e5, 1e-12)
    close(after["plant"]["net_power_W"], 12.5e6, 1e-12)
    assert after["plant"]["cycle_efficiency"] < before["plant"]["cycle_efficiency"]
    close(solved("--set", "T1.inlet.p=6 MPa", "--set", " plant.net_power = 12500 kW")["streams"]["1"]["m_kg_s"],
          after["streams"]["1"]["m_kg_s"])


def test_set_takes_a_tie():
    several = solved("--set", "C1.steam.p==max(0.001*(T1.inlet.p + 5 bar)/2; 0.05 bar)")
    assert abs(several["streams"]["2"]["p_Pa"] - 5000.0) < 1e-6, several["streams"]["2"]
    _, err = batch("solve", plant("loop.heatloom"), "--set", "C1.steam.p==T1.inlet.p*T1.inlet.h", status=2)
    assert "that comes out as a number in" in err and "but a pressure is wanted" in err, err
    found = solved("--set", "C1.steam.p==0.001*T1.inlet.p")
    close(found["streams"]["2"]["p_Pa"], 8000.0)


def test_set_says_what_yielded():
    # The exhaust enthalpy leaves no room for the assumed isentropic efficiency.
    found = solved("--set", "T1.exhaust.h=2300 kJ/kg")
    assert [item["at"] for item in found["yielded"]] == ["T1.isentropic_efficiency"], found["yielded"]
    close(found["streams"]["2"]["h_J_kg"], 2.3e6)
    out, _ = batch("solve", plant("loop.heatloom"), "--set", "T1.exhaust.h=2300 kJ/kg")
    assert "yielded" in out and found["yielded"][0]["text"] in out


def test_set_mistakes_are_named():
    loop = plant("loop.heatloom")
    refused("solve", loop, "--set", "T1.inlet.p", status=2, says="ADDRESS=VALUE")
    refused("solve", loop, "--set", "=3", status=2, says="ADDRESS=VALUE")
    refused("solve", loop, "--set", "T9.inlet.p=60 bar", status=2, says=["--set", "T9"])
    refused("solve", loop, "--set", "T1.colour=3", status=2, says="colour")
    refused("solve", loop, "--set", "T1.inlet.p=60 furlong", status=2, says="furlong")
    refused("solve", loop, "--set", "T1.inlet.p=480 °C", status=2, says="480 °C")
    refused("solve", loop, "--set", "T1.inlet.p=", status=2, says="T1.inlet.p")
    refused("solve", loop, "--set", "T1.isentropic_efficiency=1.4", status=2, says=["1.4", "isentropic"])
    refused("solve", loop, "--set", "T1.inlet.p=-3 bar", status=2, says="-3")
    refused("solve", loop, "--set", "T1.inlet.p==2*T9.inlet.p", status=2, says="T9")


def test_files_that_are_no_plants():
    refused("solve", "absent.heatloom", status=3, says="absent.heatloom")
    with open("cut.heatloom", "w", encoding="utf-8") as file:
        file.write(edited()[:400])
    refused("solve", "cut.heatloom", status=3, says="cut.heatloom")
    refused("check", "cut.heatloom", status=3, says="cut.heatloom")
    with open("foreign.heatloom", "w", encoding="utf-8") as file:
        file.write('{"type": "FeatureCollection", "features": []}')
    refused("solve", "foreign.heatloom", status=3, says="foreign.heatloom")
    with open("bytes.heatloom", "wb") as file:
        file.write(bytes(range(256)) * 8)
    refused("solve", "bytes.heatloom", status=3, says="bytes.heatloom")
    with open("empty.heatloom", "wb"):
        pass
    refused("solve", "empty.heatloom", status=3, says="empty.heatloom")
    refused("solve", ".", status=3, says=".")
    refused("solve", "-", stdin=edited(replace=[('"turbine"', '"windmill"')]), status=3, says="windmill")


def test_a_plant_comes_from_standard_input():
    out, _ = batch("solve", "-", "--json", "-", stdin=edited())
    assert json.loads(out) == solved()


def test_the_plant_in_the_docs_solves():
    with open(os.path.join(SOURCE, "docs", "file-format.md"), encoding="utf-8") as page:
        text = re.search(r"```json\n(.*?)```", page.read(), re.DOTALL)[1]
    assert json.loads(batch("solve", "-", "--json", "-", stdin=text)[0])["solved"]


def test_input_without_end_is_refused():
    refused("solve", "-", stdin=" " * (20 << 20), status=3, says="larger than")
    refused("solve", "/dev/zero", status=3, says="larger than")


def test_every_output_goes_to_files():
    out, err = batch("solve", plant("loop.heatloom"), "--json", "ö.json", "--csv", "a.csv", "--ledger", "a.txt",
                     "--drawing", "a.svg", "--diagram", "ts", "ts.svg")
    assert err == "" and "10.0" in out
    assert sorted(os.listdir()) == ["a.csv", "a.svg", "a.txt", "ts.svg", "ö.json"]       # and nothing temporary
    with open("ö.json", encoding="utf-8") as file:
        assert json.load(file) == solved()
    with open("a.csv", encoding="utf-8", newline="") as file:
        rows = list(csv.reader(file))
    assert len(rows) == 5 and all(len(row) == len(rows[0]) for row in rows)
    with open("a.txt", encoding="utf-8") as file:
        assert "480.0" in file.read()
    batch("solve", plant("loop.heatloom"), "--diagram", "hs", "hs.svg", "--diagram", "ph", "ph.svg")       # several at once
    for name in ("a.svg", "ts.svg", "hs.svg", "ph.svg"):
        assert ElementTree.parse(name).getroot().tag == "{http://www.w3.org/2000/svg}svg"


def test_pictures_have_the_format_of_their_ending():
    for kind in (["--drawing"], ["--diagram", "ts"], ["--diagram", "hs"], ["--diagram", "ph"], ["--heat", "C1"], ["--heat", "all"], ["--bands"], ["--exergy-bands"], ["--exergy-bars"]):
        for ending, start in (("svg", b"<?xml"), ("pdf", b"%PDF-"), ("png", b"\x89PNG\r\n\x1a\n")):
            batch("solve", plant("loop.heatloom"), *kind, f"x.{ending}")
            with open(f"x.{ending}", "rb") as file:
                content = file.read()
            assert content.startswith(start) and len(content) > 1000, (kind, ending)


def test_pictures_are_the_same_bytes_each_time():
    for ending in ("svg", "pdf", "png"):
        contents = []
        for _ in range(2):
            batch("solve", plant("loop.heatloom"), "--diagram", "ts", f"x.{ending}")
            with open(f"x.{ending}", "rb") as file:
                contents.append(file.read())
        assert contents[0] == contents[1], ending


def test_standard_output_takes_one_of_them():
    out, err = batch("solve", plant("loop.heatloom"), "--csv", "-")
    assert err == "" and len(list(csv.reader(io.StringIO(out)))) == 5
    out, err = batch("solve", plant("loop.heatloom"), "--drawing", "-", "--json", "x.json")
    assert err == "" and out.startswith("<?xml") and "svg" in out
    out, err = batch("solve", plant("loop.heatloom"), "--diagram", "ts", "-")
    assert err == "" and out.startswith("<?xml")


def test_a_file_that_cannot_be_written():
    for option in (["--json"], ["--csv"], ["--ledger"], ["--drawing"], ["--diagram", "ts"]):
        refused("solve", plant("loop.heatloom"), *option, "/nowhere/at/all/x.svg", status=3, says="/nowhere/at/all/x.svg")


def test_a_failed_write_leaves_the_old_file():
    os.mkdir("there")
    os.mkdir("there/x.json")            # a directory cannot be replaced by a file
    refused("solve", plant("loop.heatloom"), "--json", "there/x.json", status=3, says="there/x.json")
    assert os.listdir("there") == ["x.json"]


def test_a_missing_value_is_a_finding_with_a_mend():
    text = edited(replace=[('"exhaust.p": 8000.0', '"inlet.m": 10.0'), ('"given": {"net_power": 10000000.0}, ', '')])
    out, err = batch("solve", "-", "--json", "-", stdin=text, status=1)
    found = json.loads(out)
    assert found["solved"] is False
    errors = [finding for finding in found["findings"] if finding["grade"] == "error"]
    assert errors and any(finding["mends"] for finding in errors), found["findings"]
    assert errors[0]["text"] in err, err                 # a person hears of it too
    out, _ = batch("check", "-", stdin=text, status=1)
    assert errors[0]["text"] in out and errors[0]["mends"][0] in out, out


def test_a_value_too_many_is_a_finding():
    text = edited(replace=[('"exhaust.p": 8000.0', '"exhaust.p": 8000.0, "inlet.m": 10.0')])
    out, _ = batch("check", "-", stdin=text, status=1)
    assert re.search(r"T1|net", out), out


def test_an_impossible_plant_is_a_finding():
    text = edited(replace=[('"exhaust.p": 8000.0', '"exhaust.p": 9000000.0')])
    out, _ = batch("check", "-", stdin=text, status=1)
    assert "error: T1" in out and "90.00 bar" in out, out
    out, _ = batch("solve", "-", stdin=text, status=1)
    assert "error: T1" in out and "Cycle efficiency" not in out, out      # no figure that is no solution


def test_a_pressure_beyond_the_formulation_is_a_finding():
    found = json.loads(batch("solve", "-", "--json", "-", status=1,
                             stdin=edited(replace=[('"inlet.p": 8000000.0', '"inlet.p": 200000000.0')]))[0])
    assert not found["solved"] and found["findings"][0]["grade"] == "error", found["findings"]


def test_an_unsolved_plant_still_gives_its_drawing():
    text = edited(replace=[('"exhaust.p": 8000.0', '"exhaust.p": 9000000.0')])
    batch("solve", "-", "--drawing", "x.svg", "--csv", "x.csv", stdin=text, status=1)
    assert ElementTree.parse("x.svg").getroot().tag.endswith("svg") and os.path.getsize("x.csv") > 0


def test_check_leaves_out_what_was_dismissed():
    with open(plant("loop.heatloom"), encoding="utf-8") as file:
        whole = json.load(file)
    before, _ = batch("check", "-", stdin=json.dumps(whole))
    assert "caution: T1.exhaust_moisture: " in before, before
    whole["dismissed"] = [{"code": "exhaust-moisture", "at": "T1.exhaust_moisture"}]
    text = json.dumps(whole)
    out, _ = batch("check", "-", stdin=text)
    assert "T1.exhaust_moisture" not in out, out
    out, _ = batch("check", "-", "--all", stdin=text)
    assert "caution, dismissed: T1.exhaust_moisture: Exhaust of T1 holds" in out, out
    found = json.loads(batch("solve", "-", "--json", "-", stdin=text)[0])
    assert [item["code"] for item in found["dismissed"]] == ["exhaust-moisture"], found["dismissed"]
    assert "exhaust-moisture" not in [item["code"] for item in found["findings"]]


def test_check_is_quiet_where_all_is_well_or_says_what_it_found():
    out, err = batch("check", plant("loop.heatloom"))
    assert err == "" and out != ""


def test_strict_counts_warnings():
    found = solved()
    is_warned = any(finding["grade"] == "warning" for finding in found["findings"])
    batch("check", plant("loop.heatloom"), "--strict", status=1 if is_warned else 0)


def test_a_circuit_on_another_medium():
    kestrel = os.path.join(SOURCE, "data", "examples", "kestrel-hollow.heatloom")
    found = json.loads(batch("solve", kestrel, "--medium", "1=pentane", "--json", "-")[0])
    usual = json.loads(batch("solve", kestrel, "--json", "-")[0])
    assert found["solved"] and found["plant"]["net_power_W"] != usual["plant"]["net_power_W"]
    assert found["streams"]["7"] == usual["streams"]["7"]
    refused("solve", kestrel, "--medium", "1=whisky", status=2, says=["--medium", "whisky"])
    refused("solve", kestrel, "--medium", "pentane", status=2, says=["STREAM=MEDIUM"])


def test_the_demo_plants_solve():
    examples = os.path.join(SOURCE, "data", "examples")
    names = sorted(name for name in os.listdir(examples) if name.endswith(".heatloom"))
    assert len(names) >= 3, names
    for name in names:
        found = json.loads(batch("solve", os.path.join(examples, name), "--json", "-")[0])
        assert found["solved"] and (found["plant"].get("net_power_W", 0) > 0 or found["plant"]["cop"] > 1), name
        batch("check", os.path.join(examples, name))


main(globals())
