# The counts that tests/run.sh closes with are the true ones.
# SPDX-License-Identifier: GPL-3.0-or-later
import json
import os
import subprocess
import sys

from tap import SOURCE, main


def summary(*tests, status, logs=("log.json",)):
    with open("log.json", "w", encoding="utf-8") as log:
        for test in tests:
            log.write(json.dumps({"name": "t", "stdout": "", "returncode": 0, **test}) + "\n")
    done = subprocess.run([sys.executable, os.path.join(SOURCE, "tests", "summary.py"), *logs],
                          capture_output=True, text=True, timeout=30, check=False)
    assert done.returncode == status, done.stdout + done.stderr
    return done.stdout.splitlines()


def test_subtests_count_one_each():
    lines = summary({"result": "OK", "stdout": "# x\n1..3\nok 1 /a\nok 2 /b # SKIP no display\nok 3 /c\n"}, status=0)
    assert lines[-1] == "2 passed, 0 failed, 1 skipped", lines
    assert any("/b" in line and "no display" in line and line.startswith("SKIP") for line in lines)


def test_failures_count():
    lines = summary({"result": "FAIL", "returncode": 1, "stdout": "1..2\nnot ok 1 /a\nok 2 /b\n"}, status=1)
    assert lines[-1] == "1 passed, 1 failed, 0 skipped" and any(line.startswith("FAIL") and "/a" in line for line in lines)


def test_a_crash_counts_what_did_not_run():
    lines = summary({"result": "FAIL", "returncode": -11, "stdout": "1..3\nok 1 /a\n"}, status=1)
    assert lines[-1] == "1 passed, 2 failed, 0 skipped", lines


def test_a_crash_after_the_last_subtest_counts():
    lines = summary({"result": "FAIL", "returncode": -6, "stdout": "1..1\nok 1 /a\n"}, status=1)
    assert lines[-1] == "1 passed, 1 failed, 0 skipped", lines


def test_a_crash_before_the_first_subtest_counts():
    lines = summary({"result": "ERROR", "returncode": 127}, status=1)
    assert lines[-1] == "0 passed, 1 failed, 0 skipped", lines


def test_a_timeout_counts():
    lines = summary({"result": "TIMEOUT", "returncode": -15, "stdout": "1..2\nok 1 /a\n"}, status=1)
    assert lines[-1] == "1 passed, 1 failed, 0 skipped", lines


def test_a_whole_test_may_be_skipped():
    lines = summary({"result": "SKIP", "stdout": "1..0 # SKIP no display\n"}, {"result": "OK"}, status=0)
    assert lines[-1] == "1 passed, 0 failed, 1 skipped", lines


def test_a_log_that_is_missing_is_a_failure():
    lines = summary({"result": "OK"}, status=1, logs=("log.json", "absent.json"))
    assert lines[-1] == "1 passed, 1 failed, 0 skipped" and any("absent.json" in line for line in lines), lines
    assert summary({"result": "OK"}, status=0, logs=("--some", "log.json", "absent.json"))[-1] == "1 passed, 0 failed, 0 skipped"


def test_nothing_at_all_is_a_failure():
    assert summary(status=1)[-1] == "0 passed, 0 failed, 0 skipped"


main(globals())
