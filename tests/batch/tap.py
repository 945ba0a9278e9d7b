# A little harness: every function test_* is a subtest, reported by the TAP protocol.
# SPDX-License-Identifier: GPL-3.0-or-later
import os
import subprocess
import sys
import tempfile
import traceback

PROGRAM = os.environ.get("HEATLOOM_BATCH", "")
SOURCE = os.environ.get("HEATLOOM_SOURCE", "")
BUILD = os.environ.get("HEATLOOM_BUILD", "")


class Skip(Exception):
    """Raised by a subtest that cannot run here, with the reason."""


def batch(*arguments, stdin=None, status=0, text=True, env=None):
    """Runs heatloom-batch, asserts its exit status, returns (stdout, stderr)."""
    done = subprocess.run([PROGRAM, *arguments], input=stdin, capture_output=True, text=text, timeout=60,
                          env={**os.environ, **(env or {})}, encoding="utf-8" if text else None, check=False)
    assert done.returncode == status, \
        f"{arguments} ended with {done.returncode}, not {status}\nstdout: {done.stdout}\nstderr: {done.stderr}"
    return done.stdout, done.stderr


def refused(*arguments, status, says, stdin=None):
    """The command fails with this status, says every word on standard error, and nothing on standard output."""
    out, err = batch(*arguments, stdin=stdin, status=status)
    assert out == "", out
    assert err.startswith("heatloom-batch: "), err
    for word in [says] if isinstance(says, str) else says:
        assert word in err, f"“{word}” is not in: {err}"
    return err


def plant(name):
    """A plant file of these tests."""
    return os.path.join(SOURCE, "tests", "batch", "plants", name)


def main(names):
    tests = [(name, f) for name, f in names.items() if name.startswith("test_")]
    print(f"1..{len(tests)}", flush=True)
    failed = 0
    for number, (name, function) in enumerate(tests, 1):
        label = name[5:].replace("_", " ")
        try:
            with tempfile.TemporaryDirectory() as place:
                os.chdir(place)
                function()
                os.chdir("/")
            print(f"ok {number} {label}", flush=True)
        except Skip as reason:
            os.chdir("/")
            print(f"ok {number} {label} # SKIP {reason}", flush=True)
        except Exception:
            os.chdir("/")
            failed += 1
            for line in traceback.format_exc().splitlines():
                print(f"# {line}")
            print(f"not ok {number} {label}", flush=True)
    sys.exit(1 if failed else 0)
