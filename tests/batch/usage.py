# The command line: help, version, and what it says to mistakes.
# SPDX-License-Identifier: GPL-3.0-or-later
from tap import batch, main, refused

COMMANDS = ("solve", "check", "note", "state", "kinds", "fluids", "fuel", "template")


def test_help_names_the_commands_and_the_caution():
    out, _ = batch("--help")
    for command in COMMANDS:
        assert f"\n  {command} " in out, command
    assert "Caution" in out and "licensed practice" in out
    for later in ("sweep", "optimum", "gallery"):
        assert f"\n  {later} " not in out, later


def test_every_command_has_its_help():
    for command in COMMANDS:
        out, _ = batch(command, "--help")
        assert out.startswith(f"Usage: heatloom-batch {command}"), out
        assert "Caution" in out
    out, _ = batch("solve", "--help")
    for option in ("--set ADDRESS=VALUE", "--json FILE", "--csv FILE", "--summary FILE", "--ledger FILE", "--xlsx FILE", "--report FILE", "--drawing FILE", "--paper SIZE", "--field NAME=TEXT", "--diagram ts|hs|ph FILE", "--heat COMPONENT FILE", "--bands FILE", "--exergy-bands FILE", "--exergy-bars FILE", "--diagram-shows LIST"):
        assert option in out, option


def test_version_is_a_line():
    out, _ = batch("--version")
    assert out.startswith("heatloom-batch ") and out.count("\n") == 1, out


def test_no_command_is_an_error():
    refused(status=2, says="--help")


def test_unknown_commands_are_refused_with_the_list():
    refused("frobnicate", status=2, says=["frobnicate", "solve, check, note, variants, state, kinds, fluids, fuel"])
    refused("sweep", "x.heatloom", status=2, says="sweep")


def test_unknown_options_are_refused_with_the_list():
    refused("solve", "x.heatloom", "--ods", "a.ods", status=2, says=["--ods", "--json", "--drawing"])
    refused("check", "x.heatloom", "--json", "-", status=2, says=["--json", "--strict"])
    refused("kinds", "--all", status=2, says="--all")
    refused("solve", "-j", "x", status=2, says="-j")


def test_words_too_few_and_too_many():
    refused("solve", status=2, says="PLANT")
    refused("solve", "a", "b", status=2, says=["b", "PLANT"])
    refused("kinds", "turbine", status=2, says="turbine")
    refused("check", status=2, says="PLANT")
    refused("state", status=2, says="MEDIUM")


def test_values_of_options():
    refused("solve", "x", "--json", status=2, says=["--json", "FILE"])
    refused("solve", "x", "--diagram", "ts", status=2, says=["--diagram", "ts|hs|ph FILE"])
    refused("solve", "x", "--json", "a", "--json", "b", status=2, says="twice")
    refused("check", "x", "--strict=yes", status=2, says="--strict")
    refused("solve", "x", "--json", "-", "--csv", "-", status=2, says="standard output")
    refused("solve", "x", "--diagram", "pv", "a.svg", status=2, says=["pv", "ts, hs and ph"])
    refused("solve", "x", "--heat", "C1", "a.jpeg", status=2, says=["a.jpeg", "svg"])
    refused("solve", "x", "--drawing", "a.jpeg", status=2, says=["a.jpeg", "svg"])


def test_templates_are_files_that_solve():
    out, _ = batch("template")
    assert "back-pressure" in out and "Heaters: 1 to 8." in out, out
    plant, err = batch("template", "reheat", "--heaters", "5")
    assert err == "" and plant.count('"kind": "closed_heater"') == 4
    solved, _ = batch("solve", "-", stdin=plant)
    assert "Net power" in solved, solved
    refused("template", "nothing", status=2, says="no template")
    refused("template", "reheat", "--heaters", "9", status=2, says="from 1 to 8")
    refused("template", "simple", "--heaters", "2", status=2, says="no choice")


def test_options_may_carry_their_value():
    refused("solve", "--json=out.json", "absent.heatloom", status=3, says="absent.heatloom")
    refused("solve", "--", "--absent.heatloom", status=3, says="--absent.heatloom")


main(globals())
