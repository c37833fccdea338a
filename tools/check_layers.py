#!/usr/bin/env python3
# SPDX-FileCopyrightText: The Vialkeeper developers
# SPDX-License-Identifier: GPL-3.0-or-later
"""Fails when an include runs against the layers, or a file lacks what every file here has.

Reads the C++ files under src, db, ui, exports and tests. A layer may include itself, the layers
named in LAYERS and the libraries named there, and nothing else: what is not in the table is a
finding, so that a new folder or library is a decision somebody took. Prints one finding a line,
FILE:LINE: WHAT: HOW TO MEND. Exit status: 0 none, 1 findings, 2 nothing could be read.
"""

import argparse
import bisect
import os
import posixpath
import re
import sys
from pathlib import Path
from typing import NamedTuple

FOLDERS = ("src", "db", "ui", "exports", "tests")
SPDX = (
    "// SPDX-FileCopyrightText: The Vialkeeper developers",
    "// SPDX-License-Identifier: GPL-3.0-or-later",
)


class Layer(NamedTuple):
    """What one folder may include, itself apart."""

    layers: tuple  # names of other layers
    libraries: tuple  # names of LIBRARIES
    anything: bool = False  # a program's main file wires everything together


BASE = ("the standard library", "fmt")
CORE_LIBRARIES = BASE + ("GSL", "toml++")
OUTER = BASE + ("clock", "locale", "the system's interface")
QT_PAGES = ("QtCore", "QtGui", "QtSvg", "QtPrintSupport")
QT_ALL = QT_PAGES + ("another Qt module", "Qt's generated code")
DESKTOP_TESTS = "tests of ui"
FOUNDATION = ("text", "units", "stats", "chem")
CORE = FOUNDATION + ("charge", "gas", "light", "course", "quench")

LAYERS = {
    # The core, from the bottom up.
    "text": Layer((), CORE_LIBRARIES),
    "units": Layer(("text",), CORE_LIBRARIES),
    "stats": Layer(("text", "units"), CORE_LIBRARIES),
    # chem opens the structure module on first use, hence the loader.
    "chem": Layer(("text", "units", "stats"), CORE_LIBRARIES + ("the module loader",)),
    "chem/rdkit": Layer(FOUNDATION, CORE_LIBRARIES + ("RDKit", "InChI")),
    "charge": Layer(FOUNDATION, CORE_LIBRARIES),
    "gas": Layer(FOUNDATION + ("charge",), CORE_LIBRARIES),
    "light": Layer(FOUNDATION + ("charge", "gas"), CORE_LIBRARIES),
    "course": Layer(FOUNDATION + ("charge", "gas"), CORE_LIBRARIES),
    "quench": Layer(FOUNDATION + ("charge", "gas"), CORE_LIBRARIES),
    # Round the core.
    "app": Layer(CORE, OUTER + ("GSL", "toml++", "the module loader")),
    "db": Layer(CORE + ("app",), OUTER + ("SQLite", "libsodium", "nlohmann-json")),
    "exports": Layer(
        CORE + ("app",), OUTER + ("the module loader", "libqrencode") + QT_PAGES
    ),
    "cli": Layer(
        CORE + ("app", "exports", "db"), OUTER + ("the module loader", "CLI11", "nlohmann-json")
    ),
    "ui/models": Layer(CORE + ("app",), BASE + ("QtCore", "Qt's generated code")),
    "ui/widgets": Layer(CORE + ("app", "exports", "ui/models", "ui/charts"), BASE + QT_ALL),
    "ui/charts": Layer(CORE + ("app", "ui/models", "ui/widgets"), BASE + QT_ALL),
    "ui/desktop": Layer((), (), anything=True),
    "ui/main.cpp": Layer((), (), anything=True),
    # What the tests of all layers share: tests/*.h, tests/*.cpp and tests/support/.
    "tests": Layer(("text",), OUTER + ("Catch2",)),
}

# Where each layer's files lie, from the top of the tree. The longest match counts.
PLACES = {
    **{f"src/{name}": name for name in CORE},
    "src/chem/rdkit": "chem/rdkit",
    # What the program and the structure module agree on: seen by both, so free of RDKit.
    "src/chem/rdkit/structure_module.h": "chem",
    "src/app": "app",
    "src/cli": "cli",
    "db": "db",
    "exports": "exports",
    "ui/models": "ui/models",
    "ui/widgets": "ui/widgets",
    "ui/charts": "ui/charts",
    "ui/desktop": "ui/desktop",
    "ui/main.cpp": "ui/main.cpp",
    "tests/support": "tests",
}

STANDARD = frozenset(
    """algorithm any array atomic barrier bit bitset charconv chrono compare complex concepts
    condition_variable coroutine deque exception execution expected filesystem flat_map flat_set
    format forward_list fstream functional future generator initializer_list iomanip ios iosfwd
    iostream istream iterator latch limits list map mdspan memory memory_resource mutex new
    numbers numeric optional ostream print queue random ranges ratio regex scoped_allocator
    semaphore set shared_mutex source_location span spanstream sstream stack stacktrace stdexcept
    stdfloat stop_token streambuf string string_view strstream syncstream system_error thread
    tuple type_traits typeindex typeinfo unordered_map unordered_set utility valarray variant
    vector version cassert cctype cerrno cfenv cfloat cinttypes climits cmath csetjmp csignal
    cstdarg cstddef cstdint cstdio cstdlib cstring cuchar cwchar cwctype assert.h ctype.h errno.h
    fenv.h float.h inttypes.h limits.h math.h setjmp.h signal.h stdarg.h stddef.h stdint.h stdio.h
    stdlib.h string.h uchar.h wchar.h wctype.h""".split()
)

# First match counts. <chrono> is in STANDARD: durations are values; its clocks are CLOCK_USES.
LIBRARIES = (
    ("clock", re.compile(r"(ctime|time\.h|sys/times?\.h|sys/timeb\.h)$")),
    ("locale", re.compile(r"(locale|clocale|codecvt|x?locale\.h|langinfo\.h|libintl\.h)$")),
    ("the module loader", re.compile(r"dlfcn\.h$")),
    (
        "the system's interface",
        re.compile(r"(unistd|fcntl|poll|pwd|grp|spawn|termios|pthread|sysexits)\.h$|sys/[a-z]+\.h$"),
    ),
    ("fmt", re.compile(r"fmt/")),
    ("GSL", re.compile(r"gsl/gsl_")),
    ("toml++", re.compile(r"toml\+\+/")),
    ("InChI", re.compile(r"(inchi/)?(inchi_api|ichisize|ixa)\.h$")),
    (
        "RDKit",
        re.compile(
            r"(rdkit|GraphMol|RDGeneral|RDBoost|RDStreams|Geometry|DataStructs|DataManip|Numerics"
            r"|ForceField|DistGeom|Query|Catalogs|ChemicalFeatures|CoordGen|SimDivPickers|boost)/"
        ),
    ),
    ("SQLite", re.compile(r"(SQLiteCpp/|sqlite3(ext)?\.h$)")),
    ("libsodium", re.compile(r"sodium(\.h$|/)")),
    ("libqrencode", re.compile(r"qrencode\.h$")),
    ("CLI11", re.compile(r"CLI/")),
    ("nlohmann-json", re.compile(r"nlohmann/")),
    ("Catch2", re.compile(r"catch2/")),
    ("Qt's generated code", re.compile(r"(ui_\w+\.h|moc_\w+\.cpp|\w+\.moc)$")),
)

CLOCK_USES = re.compile(
    r"\b(?:system_clock|steady_clock|high_resolution_clock|utc_clock|tai_clock|gps_clock|file_clock"
    r"|current_zone|clock_gettime|gettimeofday|timespec_get|localtime(?:_r)?|gmtime(?:_r)?|mktime"
    r"|strftime)\b"
    r"|(?:\bstd\s*::|(?<![\w>:])::)\s*(?:time|clock)\s*\("
    r"|(?<![\w.:>])time\s*\(\s*(?:NULL|nullptr|0|&)"
)
LOCALE_USES = re.compile(
    r"\bstd\s*::\s*locale\b|\b(?:setlocale|localeconv|newlocale|uselocale|nl_langinfo)\b"
    r"|[.>]imbue\s*\("
)

# Comments, raw strings, strings and characters (not the ' within 1'000), in that order.
TOKENS = re.compile(
    r"""(?P<comment>//(?:\\\n|[^\n])*|/\*.*?(?:\*/|\Z))
      |(?P<text>R"(?P<mark>[^()\\\s]{0,16})\(.*?\)(?P=mark)"
      |"(?:\\.|[^"\\\n])*"
      |(?:(?<![0-9A-Za-z_])|(?<=\bu8)|(?<=\b[uUL]))'(?:\\.|[^'\\\n])+')""",
    re.DOTALL | re.VERBOSE,
)
INCLUDE = re.compile(
    r"^[ \t]*(?:\#|%:)(?:[ \t]|\\\n)*(?:include|include_next|import)\b(?:[ \t]|\\\n)*"
    r"(?:<(?P<angle>[^>\n]+)>|\"(?P<quote>[^\"\n]+)\"|(?P<other>[^\n]*))",
    re.MULTILINE,
)
PRAGMA_ONCE = re.compile(r"^[ \t]*#[ \t]*pragma[ \t]+once[ \t]*$", re.MULTILINE)


def blank(text):
    """Spaces of the same length, line breaks kept, so that places stay true."""
    return re.sub(r"[^\n]", " ", text)


def read_qt_headers(path):
    """The module of each Qt header named without one, and of its lower-case file."""
    modules = {}
    module = None
    for line in path.read_text(encoding="utf-8").splitlines():
        if line.startswith("#"):
            continue
        if line.startswith("["):
            module = line.strip("[] ")
            continue
        for name in line.split():
            modules[name] = module
            modules[name.lower() + ".h"] = module
    return modules


class Checker:
    """Holds one tree and collects the findings in it."""

    def __init__(self, root, qt_modules):
        self.root = root
        self.qt_modules = qt_modules
        self.findings = []
        self.files = []
        self.own_includes = {}  # file: [(line, header, included file)] where the layers allow it
        self.qt_includes = {}  # file: a Qt header that it includes itself

    def run(self):
        self.read_tree()
        self.check_qt_behind_headers()
        self.findings.sort(key=lambda finding: finding[:2])

    def read_tree(self):
        for folder in FOLDERS:
            for base, folders, names in os.walk(self.root / folder):
                folders[:] = sorted(d for d in folders if not d.startswith("."))
                for name in sorted(names):
                    path = (Path(base) / name).relative_to(self.root).as_posix()
                    if re.search(r"\.(h|cpp)$", name):
                        self.files.append(path)
                        self.check_file(path)
                    elif re.search(r"\.(hh|hpp|hxx|inl|ipp|c|cc|cxx|c\+\+|cppm|ixx)$", name):
                        self.report(path, 1, "is C++ under another ending", "call it .h or .cpp")

    def report(self, path, line, what, mend):
        self.findings.append((path, line, f"{path}:{line}: {what}: {mend}"))

    def check_file(self, path):
        try:
            source = (self.root / path).read_text(encoding="utf-8")
        except UnicodeDecodeError:
            self.report(path, 1, "is not UTF-8", "save it as UTF-8")
            return
        source = source.replace("\r\n", "\n")
        no_comments = TOKENS.sub(lambda m: blank(m[0]) if m["comment"] else m[0], source)
        code = TOKENS.sub(lambda m: blank(m[0]), source)
        breaks = [m.start() for m in re.finditer("\n", source)]

        def line_of(place):
            return bisect.bisect_left(breaks, place) + 1

        if tuple(source.split("\n")[:2]) != SPDX:
            self.report(path, 1, "lacks the two SPDX lines at its top", "begin it with " + SPDX[0]
                        + " and " + SPDX[1])
        if path.endswith(".h") and not PRAGMA_ONCE.search(code):
            self.report(path, 1, "is a header without #pragma once", "add it below the SPDX lines")

        place = self.place_of(path)
        if place is None:
            self.report(path, 1, f"{posixpath.dirname(path)}/ is in no layer",
                        "add the folder to the table in tools/check_layers.py")
            return
        name, layer = place

        for match in INCLUDE.finditer(no_comments):
            hash_at = match.start() + len(match[0]) - len(match[0].lstrip())
            if code[hash_at] not in "#%":
                continue  # it stands in a raw string
            self.check_include(path, line_of(hash_at), name, layer, match)

        if name in CORE or name == "chem/rdkit":
            for uses, what in ((CLOCK_USES, "the clock"), (LOCALE_USES, "the locale")):
                for match in uses.finditer(code):
                    word = " ".join(match[0].split())
                    self.report(path, line_of(match.start()),
                                f'uses "{word}": {name} may not use {what}',
                                "take the value as an argument, or move this to app")

    def place_of(self, path):
        """The layer's name as told to people and what it may include; None if in no layer."""
        if path.startswith("tests/"):
            inner = path.removeprefix("tests/")
            if "/" not in inner or inner.startswith("support/"):
                return "tests", LAYERS["tests"]
            if inner.startswith("ui/") and inner.count("/") == 1:
                # What the desktop's tests share wires a whole workplace together, as main.cpp does.
                return DESKTOP_TESTS, Layer((), (), anything=True)
            # tests/ mirrors the tree: tests/gas or tests/src/gas, tests/db, tests/ui/models.
            tested = self.layer_at(inner) or self.layer_at("src/" + inner)
            if tested is None:
                return None
            own = LAYERS[tested]
            desktop = tested.startswith("ui/")
            return f"tests of {tested}", Layer(
                own.layers + (tested, "tests") + ((DESKTOP_TESTS,) if desktop else ()),
                own.libraries + LAYERS["tests"].libraries + (QT_ALL if desktop else ()),
                own.anything,
            )
        name = self.layer_at(path)
        return None if name is None else (name, LAYERS[name])

    @staticmethod
    def layer_at(path):
        matches = [p for p in PLACES if path == p or path.startswith(p + "/")]
        return PLACES[max(matches, key=len)] if matches else None

    def resolve(self, path, header, quoted):
        """The included file from the top of the tree; None if it is not one of ours."""
        here = posixpath.normpath(posixpath.join(posixpath.dirname(path), header))
        if quoted and ((self.root / here).is_file() or header.startswith(".")):
            return here
        # The roots that targets put on the include path, then the layer that the name spells.
        for base in ("src", "", "ui", "tests"):
            candidate = posixpath.normpath(posixpath.join(base, header))
            if candidate.split("/")[0] in FOLDERS and (self.root / candidate).is_file():
                return candidate
        for base in ("src/", "", "ui/"):
            if "/" in header and self.layer_at(base + header):
                return base + header
        return None

    def library_of(self, header):
        for name, pattern in LIBRARIES:
            if pattern.match(header):
                return name
        if header in STANDARD:
            return "the standard library"
        qt = re.match(r"(Qt[A-Z0-9]\w*)/", header)
        if qt or header in self.qt_modules or re.match(r"Q[A-Za-z0-9]+$|q[a-z0-9_]+\.h$", header):
            module = qt[1] if qt else self.qt_modules.get(header, "")
            return module if module in QT_PAGES else "another Qt module"
        return None

    def check_include(self, path, line, name, layer, match):
        header = match["angle"] or match["quote"]
        if header is None:
            self.report(path, line, f'includes {match["other"].strip() or "nothing"}',
                        "write the header's name, so that it can be checked")
            return
        own = self.resolve(path, header, match["quote"] is not None)
        if own is not None:
            place = self.place_of(own)
            other = None if place is None else place[0]
            if other is None:
                self.report(path, line, f'includes "{header}", which is in no layer',
                            "add its folder to the table in tools/check_layers.py")
            elif not (layer.anything or other == name or other in layer.layers):
                self.report(path, line,
                            f'includes "{header}": {name} may not include {other}',
                            f"move what is needed down from {other} into a layer that {name} may "
                            "include, or this code up")
            else:
                self.own_includes.setdefault(path, []).append((line, header, own))
            return
        library = self.library_of(header)
        if library in QT_ALL:
            self.qt_includes.setdefault(path, header)
        if layer.anything:
            return
        if library is None:
            self.report(path, line, f'includes "{header}", neither in the tree nor a known library',
                        "correct it, or add the library to the table in tools/check_layers.py")
        elif library not in layer.libraries:
            users = [n for n, each in LAYERS.items() if library in each.libraries and n != "tests"]
            if library == "Catch2":
                users = ["tests"]
            self.report(path, line, f'includes "{header}": {name} may not use {library}',
                        f"move this to {' or '.join(users) or 'ui/main.cpp'}")

    def check_qt_behind_headers(self):
        """A layer without Qt may include one with Qt, but only those of its headers that have none."""
        for path in self.files:
            place = self.place_of(path)
            if place is None or place[1].anything or set(QT_ALL) & set(place[1].libraries):
                continue
            for line, header, own in self.own_includes.get(path, []):
                chain = self.chain_to_qt(own)
                if chain and set(QT_ALL) & set(self.place_of(own)[1].libraries):
                    self.report(path, line,
                                f'includes "{header}", behind which stands <{chain[-1]}>: '
                                f"{place[0]} may not use Qt",
                                f"keep Qt out of {chain[-2]}, in the .cpp files behind it")

    def chain_to_qt(self, start):
        """The files from here to a Qt header, that header last; empty if none is included."""
        chains = [[start]]
        seen = {start}
        while chains:
            chain = chains.pop(0)
            if chain[-1] in self.qt_includes:
                return chain + [self.qt_includes[chain[-1]]]
            for _, _, own in self.own_includes.get(chain[-1], []):
                if own not in seen:
                    seen.add(own)
                    chains.append(chain + [own])
        return []


def main(arguments=None):
    here = Path(__file__).resolve().parent
    parser = argparse.ArgumentParser(description=__doc__.splitlines()[0])
    parser.add_argument("--root", type=Path, default=here.parent,
                        help="top of the tree to read (default: the one this script is in)")
    root = parser.parse_args(arguments).root
    checker = Checker(root, read_qt_headers(here / "qt_headers.txt"))
    checker.run()
    if not checker.files:
        print(f"{root}: no C++ file under {', '.join(FOLDERS)}: give the tree's top as --root",
              file=sys.stderr)
        return 2
    if checker.findings:
        print("\n".join(finding[2] for finding in checker.findings))
        print(f"{len(checker.files)} files, {len(checker.findings)} against the layers",
              file=sys.stderr)
        return 1
    print(f"{len(checker.files)} files, no include against the layers")
    return 0


if __name__ == "__main__":
    sys.exit(main())
