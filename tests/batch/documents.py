# The documents: links lead somewhere, and the commands in them do what they say.
# SPDX-License-Identifier: GPL-3.0-or-later
import glob
import os
import re
import shlex
import shutil
import subprocess

from tap import PROGRAM, SOURCE, main, plant

PAGES = [os.path.join(SOURCE, name) for name in ("README.md", "DEVELOPERS.md")] + sorted(glob.glob(os.path.join(SOURCE, "docs", "*.md")))


def text_of(page):
    with open(page, encoding="utf-8") as file:
        return file.read()


def test_every_link_leads_to_a_file():
    broken = []
    for page in PAGES:
        for target in re.findall(r"\]\(([^)#]+)", text_of(page)):
            if "://" not in target and not os.path.exists(os.path.join(os.path.dirname(page), target)):
                broken.append(f"{os.path.basename(page)}: {target}")
    assert broken == [], broken


def test_every_page_is_reached_from_the_first():
    seen, todo = set(), [PAGES[0]]
    while todo:
        page = todo.pop()
        if page not in seen:
            seen.add(page)
            todo += [os.path.normpath(os.path.join(os.path.dirname(page), target))
                     for target in re.findall(r"\]\(([^)#]+\.md)", text_of(page))]
    assert set(PAGES) <= seen, set(PAGES) - seen


def test_the_batch_commands_of_the_readme_run():
    commands = re.findall(r"^heatloom-batch .*$", text_of(PAGES[0]), re.MULTILINE)
    assert len(commands) >= 6, commands
    shutil.copy(plant("loop.heatloom"), "plant.heatloom")
    with open("measured.csv", "w", encoding="utf-8") as table:
        table.write("p_Pa,T_K\n8e6,753.15\n")
    os.mkdir("bin")
    os.symlink(PROGRAM, "bin/heatloom-batch")
    for command in commands:
        words = shlex.split(command, comments=True)
        assert words[0] == "heatloom-batch", command
        done = subprocess.run(["/bin/sh", "-c", command], capture_output=True, text=True, timeout=60, check=False,
                              env={**os.environ, "PATH": f"{os.path.abspath('bin')}:/usr/bin:/bin"})
        assert done.returncode == 0 and done.stderr == "", (command, done.stderr)
    for name in ("streams.csv", "plant.pdf", "ts.svg", "report.pdf", "tables.xlsx", "states.csv"):
        assert os.path.getsize(name) > 0, name


def test_the_caution_is_on_the_first_page():
    text = text_of(PAGES[0])
    for words in ("## Caution", "concepts", "poison", "licensed practice decide"):
        assert words in " ".join(text.split()), words


main(globals())
