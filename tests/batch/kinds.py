# heatloom-batch kinds, and docs/components.md that is made from it.
# SPDX-License-Identifier: GPL-3.0-or-later
import os

from tap import SOURCE, batch, main

KINDS = ("heat_input", "boiler", "turbine", "generator", "condenser", "pump", "pipe", "valve", "open_heater",
         "closed_heater", "splitter", "mixer", "steam_user", "make_up", "boundary", "cooling_tower", "air_condenser", "district_heater", "recuperator", "exchanger")


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


def test_the_page_in_docs_is_this_one():
    # When this fails: build/src/batch/heatloom-batch kinds > docs/components.md
    out, _ = batch("kinds")
    with open(os.path.join(SOURCE, "docs", "components.md"), encoding="utf-8") as page:
        assert page.read() == out, "docs/components.md is old; make it anew: heatloom-batch kinds > docs/components.md"


main(globals())
