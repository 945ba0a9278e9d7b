#!/usr/bin/env python3
# Prints every result that the logs of `meson test` hold, subtests too, and the true counts.
# SPDX-License-Identifier: GPL-3.0-or-later
"""summary.py [--some] LOG.json ...

A test that speaks TAP counts by its subtests; a subtest that was announced and
never ran counts as failed, and so does a program that ends badly after its last
subtest.  Any other test counts as one.  Exit status 1 when anything failed or
nothing ran.
"""

import json
import re
import sys

RESULT = re.compile(r"^(not )?ok\b\s*\d*\s*-?\s*(.*?)\s*(?:(?<!\\)#\s*(SKIP|TODO)\b\s*(.*))?$", re.IGNORECASE)
PLAN = re.compile(r"^1\.\.(\d+)\s*(?:#\s*SKIP\b\s*(.*))?$", re.IGNORECASE)


def read_tap(text):
    """(plan, subtests): the announced number or None, and (result, name, reason) each."""
    plan, subtests = None, []
    for line in text.splitlines():
        if match := PLAN.match(line):
            plan = int(match[1])
            if plan == 0:
                subtests.append(("SKIP", "", match[2] or ""))
        elif match := RESULT.match(line):
            failed, name, directive, reason = match.groups()
            directive = (directive or "").upper()
            if directive == "SKIP":
                subtests.append(("SKIP", name, reason or ""))
            elif failed and directive != "TODO":
                subtests.append(("FAIL", name, ""))
            else:
                subtests.append(("ok", name, ""))
    return plan, subtests


def results_of(test):
    """The results that one entry of the log stands for."""
    outcome = test["result"]
    plan, subtests = read_tap(test.get("stdout") or "")
    if plan is None and not subtests:
        known = {"OK": "ok", "EXPECTEDFAIL": "ok", "SKIP": "SKIP"}
        return [(known.get(outcome, "FAIL"), "", "" if outcome in known else outcome.lower())]
    subtests += [("FAIL", f"subtest {n + 1}", "did not run") for n in range(len(subtests), plan or 0)]
    ended_well = outcome in ("OK", "SKIP", "EXPECTEDFAIL")
    if not ended_well and not any(result == "FAIL" for result, _, _ in subtests):
        subtests.append(("FAIL", "the program", f"ended badly ({outcome.lower()}, status {test.get('returncode')})"))
    return subtests


def main(arguments):
    counts = {"ok": 0, "FAIL": 0, "SKIP": 0}
    for path in arguments:
        if path == "--some":
            continue
        try:
            with open(path, encoding="utf-8", errors="replace") as log:
                tests = [json.loads(line) for line in log if line.strip()]
        except FileNotFoundError:
            if "--some" not in arguments:
                counts["FAIL"] += 1
                print(f"FAIL {path}  (was not written: none of its tests ran)")
            continue
        for test in tests:
            for result, name, reason in results_of(test):
                counts[result] += 1
                label = f"{test['name']}: {name}" if name else test["name"]
                print(f"{result:4} {label}" + (f"  ({reason})" if reason else ""))
    print(f"{counts['ok']} passed, {counts['FAIL']} failed, {counts['SKIP']} skipped")
    return 1 if counts["FAIL"] or not sum(counts.values()) else 0


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
