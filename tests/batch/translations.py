# Every word on screen can be translated, and German is whole.
# SPDX-License-Identifier: GPL-3.0-or-later
import glob
import json
import os
import re
import shutil
import subprocess

from tap import BUILD, SOURCE, Skip, batch, main, plant

MARKED = re.compile(r"(?<![A-Za-z0-9_])(?:_|N_|C_|NC_|ngettext_hl) ?\(")
GERMAN = {"LC_ALL": "C.UTF-8", "LANGUAGE": "de", "APP_LOCALEDIR": os.path.join(BUILD, "po")}


def run(*command):
    for tool in ("xgettext", "msgmerge", "msgfmt"):
        if shutil.which(tool) is None:
            raise Skip(f"there is no {tool}")
    done = subprocess.run(command, capture_output=True, text=True, timeout=60, check=False, cwd=SOURCE,
                          env={**os.environ, "LC_ALL": "C.UTF-8"})
    assert done.returncode == 0, f"{command}\n{done.stdout}{done.stderr}"
    return done.stderr


def listed():
    with open(os.path.join(SOURCE, "po", "POTFILES.in"), encoding="utf-8") as file:
        return [line.strip() for line in file if line.strip() and not line.startswith("#")]


def test_every_file_with_words_is_listed():
    with_words = []
    for path in glob.glob(os.path.join(SOURCE, "src", "**", "*"), recursive=True):
        if path.endswith((".c", ".h", ".ui")) and not path.endswith("i18n.h"):
            with open(path, encoding="utf-8") as file:
                text = file.read()
            if (path.endswith((".c", ".h")) and MARKED.search(text)) or 'translatable="yes"' in text:
                with_words.append(os.path.relpath(path, SOURCE))
    sources = [name for name in listed() if name.startswith("src/")]
    assert set(with_words) == set(sources), f"missing {set(with_words) - set(sources)}, too many {set(sources) - set(with_words)}"
    assert listed() == sorted(listed())


def test_german_is_whole_and_fits_the_sources():
    pot, merged = os.path.abspath("heatloom.pot"), os.path.abspath("de.po")
    run("xgettext", "--files-from=po/POTFILES.in", "--from-code=UTF-8", "--keyword=_", "--keyword=N_", "--keyword=C_:1c,2",
        "--keyword=NC_:1c,2", "--keyword=ngettext_hl:1,2", f"--output={pot}")
    run("msgmerge", "--quiet", "--no-fuzzy-matching", f"--output-file={merged}", "po/de.po", pot)
    told = run("msgfmt", "--check", "--statistics", "--output-file=/dev/null", merged)
    counts = {word: int(n) for n, word in re.findall(r"(\d+) (translated|fuzzy|untranslated)", told)}
    if set(counts) != {"translated"}:
        missing = subprocess.run(["msgattrib", "--untranslated", "--no-obsolete", "--no-wrap", merged], capture_output=True, text=True,
                                 check=False).stdout
        raise AssertionError(f"{told}\n{missing}")
    assert counts["translated"] > 100, told


def test_nothing_in_german_was_left_in_english():
    # Words that are the same in both languages stand alone, and so do equations; a sentence is never the same.
    merged = subprocess.run(["msgcat", "--no-wrap", "po/de.po"], cwd=SOURCE, capture_output=True, text=True, check=True).stdout
    same = [source for source, german in re.findall(r'^msgid "(.*)"\nmsgstr "(.*)"$', merged, re.MULTILINE)
            if source == german and len(re.findall(r"[A-Za-z]{3,}", source)) >= 4]
    assert same == [], same


def test_the_batch_program_speaks_german():
    out, _ = batch("--help", env=GERMAN)
    assert "Aufruf: heatloom-batch" in out and "Vorsicht" in out, out
    out, _ = batch("state", "water", "p=80 bar", "T=480 °C", env=GERMAN)
    assert "Druck" in out and "80.00 bar" in out, out       # decimal points in every language
    _, err = batch("frobnicate", env=GERMAN, status=2)
    assert "gibt es nicht" in err, err
    out, _ = batch("solve", plant("loop.heatloom"), env=GERMAN)
    assert "Nettoleistung" in out, out


def test_json_stays_the_same_in_german():
    english, german = (json.loads(batch("solve", plant("loop.heatloom"), "--json", "-", env=env)[0]) for env in ({}, GERMAN))
    # The first finding is there, so that there are words to differ.
    assert english["findings"] and english["findings"][0]["text"] != german["findings"][0]["text"]
    for found in (english, german):
        for finding in found["findings"]:
            finding["mends"] = len(finding["mends"])
            del finding["text"]
            finding.pop("source", None)      # words too
    assert english == german


main(globals())
