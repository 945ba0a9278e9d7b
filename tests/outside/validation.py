# docs/validation.md: published values beside ours, written by the tests that assert them.
# SPDX-License-Identifier: GPL-3.0-or-later
# Usage: validation.py PROGRAM ...       compares the page with what the programs say now (a test, TAP)
#        validation.py --write PROGRAM ...   writes the page
import os
import subprocess
import sys
import tempfile

SOURCE = os.environ["HEATLOOM_SOURCE"]
PAGE = os.path.join(SOURCE, "docs", "validation.md")

HEAD = """# Validation

Published values beside ours. The tests that assert these rows write this page (`tests/outside/validation.py --write`), and a test compares it with
what they say now; nothing in it is typed by hand. *Allowed* is the largest difference that the test accepts. A value *from memory* was set down by
somebody who knows the book, not read there again. What was checked of each medium stands in [validation-media.md](validation-media.md).
"""


def rows_of(programs):
    rows = []
    for program in programs:
        with tempfile.TemporaryDirectory() as folder:
            path = os.path.join(folder, "rows")
            done = subprocess.run([program], env={**os.environ, "HEATLOOM_VALIDATION": path}, capture_output=True, text=True, timeout=300, check=False)
            assert done.returncode == 0, f"{program}: {done.stdout[-2000:]}{done.stderr[-2000:]}"
            assert os.path.exists(path), f"{program} has nothing to validate"
            with open(path, encoding="utf-8") as file:
                rows += [line.rstrip("\n").split("\t") for line in file]
    return rows


def plain(number):
    """A number without an exponent."""
    return f"{float(number):.0f}" if "e+" in number else number


def difference(published, ours, unit):
    if unit in ("°C", "K"):
        return f"{float(ours) - float(published):+.2g} K"
    return f"{(float(ours) - float(published)) / abs(float(published)) * 100:+.2g} %" if float(published) != 0.0 else f"{float(ours):+.2g}"


def allowed(published, tolerance, unit):
    if unit in ("°C", "K"):
        return f"{float(tolerance):.2g} K"
    return f"{float(tolerance) / abs(float(published)) * 100:.2g} %" if float(published) != 0.0 else f"{float(tolerance):.2g}"


def page_of(rows):
    text, section, source = [HEAD], None, None
    count = 0
    for row in rows:
        section_now, subject, source_now, quantity, unit, published, ours, tolerance = row
        if section_now != section:
            text.append(f"\n## {section_now}\n")
            section, source = section_now, None
        if source_now != source:
            text.append(f"\n{source_now}:\n\n| | quantity | published | ours | difference | allowed |\n|---|---|---|---|---|---|\n")
            source = source_now
        unit_text = "" if unit == "1" else f" {unit}"
        text.append(f"| {subject} | {quantity} | {plain(published)}{unit_text} | {plain(ours)}{unit_text} | {difference(published, ours, unit)} | {allowed(published, tolerance, unit)} |\n")
        count += 1
    text.append(f"\n{count} values.\n")
    return "".join(text)


def grouped(rows):
    """Rows of one section together, and of one source within it, in the order of their first."""
    sections = {}
    for row in rows:
        sections.setdefault(row[0], {}).setdefault(row[2], []).append(row)
    in_order = sorted(sections, key=lambda section: section.startswith("Media"))      # plants first; the order is kept otherwise
    return [row for section in in_order for same in sections[section].values() for row in same]


def main(arguments):
    is_writing = arguments[:1] == ["--write"]
    page = page_of(grouped(rows_of(arguments[1:] if is_writing else arguments)))
    if is_writing:
        with open(PAGE, "w", encoding="utf-8") as file:
            file.write(page)
        return 0
    with open(PAGE, encoding="utf-8") as file:
        kept = file.read()
    same = kept == page
    print("1..1")
    if not same:
        for ours, theirs in zip(page.splitlines(), kept.splitlines()):
            if ours != theirs:
                print(f"# now:  {ours}\n# page: {theirs}")
                break
        print("# write the page anew: tests/outside/validation.py --write (see DEVELOPERS.md)")
    print(f"{'ok' if same else 'not ok'} 1 - the page says what the tests find")
    return 0 if same else 1


sys.exit(main(sys.argv[1:]))
