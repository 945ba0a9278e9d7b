# `meson install` into a staging directory: what is there, whether it is valid, and whether the library serves others.
# SPDX-License-Identifier: GPL-3.0-or-later
import glob
import os
import re
import shutil
import subprocess
import tempfile
import xml.etree.ElementTree as ElementTree

from tap import BUILD, SOURCE, Skip, main, plant

APPLICATION = "local.heatloom.Heatloom"
PREFIX = os.environ["HEATLOOM_PREFIX"].lstrip("/")


def run(*command, env=None):
    # meson leads the tests to the library of the build; what is installed must not need that.
    inherited = {name: value for name, value in os.environ.items() if name != "LD_LIBRARY_PATH"}
    done = subprocess.run(command, capture_output=True, text=True, timeout=120, check=False, env={**inherited, **(env or {})})
    assert done.returncode == 0, f"{command} ended with {done.returncode}\n{done.stdout}{done.stderr}"
    return done.stdout


def need(tool):
    if shutil.which(tool) is None:
        raise Skip(f"there is no {tool}")


STAGE = tempfile.TemporaryDirectory()


def stage():
    """Installs, the first time, and returns the prefix in the staging directory."""
    if not os.listdir(STAGE.name):
        run("meson", "install", "--no-rebuild", "--quiet", "-C", BUILD, "--destdir", STAGE.name)
    return os.path.join(STAGE.name, PREFIX)


def one(pattern):
    found = glob.glob(pattern, recursive=True)
    assert len(found) == 1, f"{pattern}: {found}"
    return found[0]


def test_everything_is_there():
    prefix = stage()
    share = os.path.join(prefix, "share")
    for name in ("heatloom", "heatloom-batch"):
        assert os.access(os.path.join(prefix, "bin", name), os.X_OK), name
    for name in (f"applications/{APPLICATION}.desktop", f"metainfo/{APPLICATION}.metainfo.xml", f"mime/packages/{APPLICATION}.xml",
                 f"icons/hicolor/scalable/apps/{APPLICATION}.svg", f"icons/hicolor/symbolic/apps/{APPLICATION}-symbolic.svg",
                 "locale/de/LC_MESSAGES/heatloom.mo", "heatloom/schema/heatloom-1.schema.json"):
        assert os.path.getsize(os.path.join(share, name)) > 0, name
    assert len(glob.glob(f"{share}/heatloom/examples/*.heatloom")) >= 3
    for name in ("fluid/fluid.h", "plant/plant.h", "engine/engine.h"):
        assert os.path.exists(os.path.join(prefix, "include", "heatloom", name)), name
    one(f"{prefix}/**/libheatloom.so")


def test_desktop_entry_is_valid():
    need("desktop-file-validate")
    entry = os.path.join(stage(), "share", "applications", f"{APPLICATION}.desktop")
    run("desktop-file-validate", entry)
    with open(entry, encoding="utf-8") as file:
        assert "Comment[de]=" in file.read()


def test_metainfo_is_valid():
    need("appstreamcli")
    metainfo = os.path.join(stage(), "share", "metainfo", f"{APPLICATION}.metainfo.xml")
    run("appstreamcli", "validate", "--no-net", metainfo)
    languages = [item.attrib.get("{http://www.w3.org/XML/1998/namespace}lang") for item in ElementTree.parse(metainfo).iter("summary")]
    assert set(languages) == {None, "de"}, languages


def test_mime_type_is_known():
    need("update-mime-database")
    mime = os.path.join(stage(), "share", "mime")
    run("update-mime-database", mime)
    with open(os.path.join(mime, "globs2"), encoding="utf-8") as globs:
        assert "application/x-heatloom+json:*.heatloom" in globs.read()


def test_icons_are_pictures():
    need("rsvg-convert")
    for icon in glob.glob(f"{stage()}/share/icons/hicolor/*/apps/*.svg"):
        run("rsvg-convert", "-w", "64", icon, "-o", "icon.png")
        assert os.path.getsize("icon.png") > 300, icon


def test_only_public_names_leave_the_library():
    need("nm")
    library = one(f"{stage()}/**/libheatloom.so")
    names = [line.split()[-1] for line in run("nm", "-D", "--defined-only", library).splitlines()]
    assert "hl_solve" in names
    assert all(name.startswith("hl_") for name in names), [name for name in names if not name.startswith("hl_")]


def test_headers_stand_alone():
    need("cc")
    prefix = stage()
    flags = run("pkg-config", "--cflags", "json-glib-1.0").split()
    include = os.path.join(prefix, "include", "heatloom")
    for header in glob.glob(f"{include}/**/*.h", recursive=True):
        run("cc", "-std=gnu11", "-Wall", "-Werror", "-fsyntax-only", f"-I{include}", *flags, "-include", header, "-x", "c", "/dev/null")


def test_the_program_in_the_readme_runs():
    need("cc")
    prefix = stage()
    with open(os.path.join(SOURCE, "README.md"), encoding="utf-8") as readme:
        program = re.search(r"```c\n(.*?)```", readme.read(), re.DOTALL)[1]
    with open("example.c", "w", encoding="utf-8") as file:
        file.write(program)
    pc = one(f"{prefix}/**/heatloom.pc")
    env = {"PKG_CONFIG_PATH": os.path.dirname(pc), "PKG_CONFIG_SYSROOT_DIR": STAGE.name}
    # The staged files are found below the stage, the system's own without it.
    flags = run("pkg-config", "--cflags", "--libs", "heatloom", env=env).replace(f"{STAGE.name}/usr/include", "/usr/include") \
        .replace(f"{STAGE.name}/usr/lib", "/usr/lib").split()
    run("cc", "-Wall", "-Werror", "example.c", "-o", "example", *flags)
    library = os.path.dirname(one(f"{prefix}/**/libheatloom.so"))
    out = run("./example", plant("loop.heatloom"), env={"LD_LIBRARY_PATH": library})
    assert "10.0" in out and "MW" in out, out


def test_the_staged_programs_find_their_library():
    prefix = stage()
    out = run(os.path.join(prefix, "bin", "heatloom-batch"), "state", "water", "p=1 bar", "x=1")
    assert "IAPWS" in out
    need("ldd")
    linked = run("ldd", os.path.join(prefix, "bin", "heatloom"))
    assert os.path.realpath(re.search(r"libheatloom\S* => (\S+)", linked)[1]).startswith(os.path.realpath(prefix)), linked


main(globals())
