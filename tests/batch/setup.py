# src/setup.sh: what is installed, when, and what is said when it cannot be.
# SPDX-License-Identifier: GPL-3.0-or-later
import os
import subprocess

from tap import SOURCE, main

# Stand-ins for the system's tools: they say what they were asked on a log.
TOOLS = {
    "dpkg-query": 'for p in "$@"; do case $p in gcc|meson) printf " %s=installed " $p;; gone) printf " gone=config-files ";; esac; done',
    "apt-get": 'echo "apt-get $*" >>log; case " $* " in *" install "*) exit ${APT_STATUS:-0};; esac; exit ${UPDATE_STATUS:-0}',
    "sudo": 'echo "sudo $*" >>log; [ -z "$SUDO_REFUSES" ] || exit 1; [ "$1" != -n ] || shift; exec "$@"',
    "id": "echo ${USER_ID:-0}",
}


def need(*packages, tools=("dpkg-query", "apt-get", "sudo", "id"), status=0, **env):
    """Runs need_packages with these tools only; returns the log's lines and what was said."""
    os.makedirs("bin", exist_ok=True)
    for name in os.listdir("bin"):
        os.remove(f"bin/{name}")
    for name in tools:
        with open(f"bin/{name}", "w", encoding="utf-8") as file:
            file.write(f"#!/bin/sh\n{TOOLS[name]}\n")
        os.chmod(f"bin/{name}", 0o755)
    for name in ("env", "sh", "true"):
        os.symlink(f"/usr/bin/{name}" if os.path.exists(f"/usr/bin/{name}") else f"/bin/{name}", f"bin/{name}")
    if os.path.exists("log"):
        os.remove("log")
    done = subprocess.run(["/bin/sh", "-uc", f". {SOURCE}/src/setup.sh; need_packages {' '.join(packages)}"], text=True, timeout=30,
                          capture_output=True, check=False, stdin=subprocess.DEVNULL, env={"PATH": os.path.abspath("bin"), **env})
    assert done.returncode == status, (done.returncode, done.stdout, done.stderr)
    log = open("log", encoding="utf-8").read().splitlines() if os.path.exists("log") else []
    return log, done.stdout + done.stderr


def test_nothing_is_asked_when_all_are_there():
    log, said = need("gcc", "meson")
    assert log == [] and said == "", (log, said)
    log, said = need("gcc", USER_ID="1000")
    assert log == [] and said == "", (log, said)


def test_only_what_is_missing_is_installed():
    log, said = need("gcc", "xvfb", "meson", "gone")
    assert len(log) == 2 and " update" in log[0], log
    assert log[1].endswith("install --no-install-recommends xvfb gone") and " -y " in log[1], log
    assert "xvfb gone" in said


def test_sudo_is_used_when_not_root():
    log, _ = need("xvfb", USER_ID="1000")
    assert log[0] == "sudo -n true" and any(line.startswith("sudo -n env") for line in log), log


def test_a_failed_update_is_not_the_end():
    log, said = need("xvfb", UPDATE_STATUS="100")
    assert len(log) == 2 and "update had errors" in said, (log, said)


def test_what_to_do_by_hand_is_said():
    by_hand = "apt-get install --no-install-recommends xvfb"
    for options in ({"tools": ("dpkg-query", "apt-get", "id"), "USER_ID": "1000"},      # neither root nor sudo
                    {"USER_ID": "1000", "SUDO_REFUSES": "1"},
                    {"tools": ("dpkg-query", "id")},                                      # no apt-get
                    {"APT_STATUS": "100"}):                                               # no network
        log, said = need("gcc", "xvfb", status=1, **options)
        assert by_hand in said and "heatloom: " in said, (options, log, said)


def test_other_systems_are_told_the_list():
    log, said = need("gcc", "xvfb", tools=("id",))
    assert log == [] and "gcc xvfb" in said, said


def test_every_script_can_be_read():
    for name in ("src/run.sh", "src/setup.sh", "tests/run.sh"):
        subprocess.run(["/bin/sh", "-n", os.path.join(SOURCE, name)], check=True, timeout=30)
    subprocess.run(["/bin/bash", "-n", os.path.join(SOURCE, ".ci", "run")], check=True, timeout=30)
    assert os.access(os.path.join(SOURCE, ".ci", "run"), os.X_OK)


main(globals())
