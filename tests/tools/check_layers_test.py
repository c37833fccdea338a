#!/usr/bin/env python3
# SPDX-FileCopyrightText: The Vialkeeper developers
# SPDX-License-Identifier: GPL-3.0-or-later
"""Shows that tools/check_layers.py finds each kind of violation, and nothing in a clean tree."""

import contextlib
import importlib.util
import io
import tempfile
import unittest
from pathlib import Path

ROOT = Path(__file__).resolve().parents[2]
_spec = importlib.util.spec_from_file_location("check_layers", ROOT / "tools" / "check_layers.py")
check_layers = importlib.util.module_from_spec(_spec)
_spec.loader.exec_module(check_layers)

HEAD = "\n".join(check_layers.SPDX) + "\n"

CLEAN = {
    "src/text/fault.h": "#include <expected>\n#include <fmt/format.h>\n",
    "src/units/quantity.h": '#include <chrono>\n#include "text/fault.h"\n',
    "src/stats/fit.cpp": '#include <gsl/gsl_multifit.h>\n#include "units/quantity.h"\n',
    "src/chem/formula.h": '#include "units/quantity.h"\n',
    "src/chem/loader.cpp": '#include <dlfcn.h>\n#include "chem/rdkit/structure_module.h"\n',
    "src/chem/rdkit/structure_module.h": '#include "chem/formula.h"\n',
    "src/chem/rdkit/reader.h": "#include <GraphMol/GraphMol.h>\n",
    "src/chem/rdkit/reader.cpp": '#include <inchi_api.h>\n#include "chem/rdkit/reader.h"\n',
    "src/charge/plan.h": '#include <toml++/toml.h>\n#include "chem/formula.h"\n',
    "src/gas/ledger.h": '#include "charge/plan.h"\n',
    "src/light/flux.h": '#include "charge/plan.h"\n#include "gas/ledger.h"\n',
    "src/course/fit.h": '#include "gas/ledger.h"\n',
    "src/quench/shares.h": '#include "charge/plan.h"\n',
    "src/app/close_run.h": '#include <ctime>\n#include "course/fit.h"\n#include "gas/ledger.h"\n',
    "src/cli/main.cpp": '#include <CLI/CLI.hpp>\n#include <nlohmann/json.hpp>\n'
                        '#include "app/close_run.h"\n#include "exports/sheet.h"\n'
                        '#include "db/book.h"\n',
    "db/book.h": '#include <SQLiteCpp/SQLiteCpp.h>\n#include <sqlite3.h>\n#include <sodium.h>\n'
                 '#include "app/close_run.h"\n',
    "exports/sheet.h": '#include "charge/plan.h"\n',
    "exports/page.h": "#include <QPainter>\n#include <QtGui/QNewInLaterVersions>\n",
    "exports/sheet.cpp": '#include <QPdfWriter>\n#include <QSvgRenderer>\n#include <QString>\n'
                         '#include <QPrinter>\n#include <qrencode.h>\n#include "page.h"\n'
                         '#include "sheet.h"\n',
    "ui/models/runs.h": '#include <QAbstractItemModel>\n#include <qstring.h>\n'
                        '#include "app/close_run.h"\n',
    "ui/charts/plot.h": "#include <QtCharts/QChart>\n#include <QPainter>\n",
    "ui/widgets/runs.h": '#include <QTableView>\n#include "ui/models/runs.h"\n'
                         '#include "charts/plot.h"\n',
    "ui/main.cpp": '#include <QApplication>\n#include "db/book.h"\n#include "exports/sheet.h"\n'
                   '#include "ui/widgets/runs.h"\n',
    "tests/catch_compat.h": "#include <catch2/catch.hpp>\n",
    "tests/gas/ledger_test.cpp": '#include <catch2/catch.hpp>\n#include <clocale>\n'
                                 '#include "catch_compat.h"\n#include "charge/plan.h"\n'
                                 '#include "gas/ledger.h"\n',
    "tests/src/units/quantity_test.cpp": '#include "units/quantity.h"\n',
    "tests/exports/sheet_test.cpp": '#include <QImage>\n#include "exports/sheet.h"\n',
    "tests/ui/models/runs_test.cpp": '#include <QString>\n#include "ui/models/runs.h"\n',
}


class Tree:
    """A small tree in a folder of its own, looked at by the check."""

    def __init__(self, files, head=HEAD):
        self.files = {}
        for path, text in files.items():
            once = "#pragma once\n" if path.endswith(".h") else ""
            self.files[path] = head + once + text

    def check(self):
        """The exit status and all lines printed."""
        with tempfile.TemporaryDirectory() as folder:
            for path, text in self.files.items():
                place = Path(folder) / path
                place.parent.mkdir(parents=True, exist_ok=True)
                place.write_bytes(text.encode() if isinstance(text, str) else text)
            out = io.StringIO()
            with contextlib.redirect_stdout(out), contextlib.redirect_stderr(io.StringIO()):
                status = check_layers.main(["--root", folder])
            return status, out.getvalue().splitlines()


class CleanTrees(unittest.TestCase):
    def test_a_tree_in_order_passes(self):
        status, lines = Tree(CLEAN).check()
        self.assertEqual(lines, [f"{len(CLEAN)} files, no include against the layers"])
        self.assertEqual(status, 0)

    def test_this_tree_passes(self):
        out = io.StringIO()
        with contextlib.redirect_stdout(out), contextlib.redirect_stderr(io.StringIO()):
            status = check_layers.main(["--root", str(ROOT)])
        self.assertEqual(status, 0, out.getvalue())

    def test_an_empty_folder_is_not_taken_for_a_clean_tree(self):
        self.assertEqual(Tree({}).check()[0], 2)

    def test_words_in_comments_and_texts_are_not_uses(self):
        tree = Tree({
            "src/units/a.cpp": '// #include <QString>, steady_clock\n/*\n#include "app/x.h"\n*/\n'
                               'const char* a = "std::locale // setlocale";\n'
                               'const char* b = R"x(\n#include <QString>\n"system_clock")x";\n'
                               "const char c = '\"'; const int d = 1'000; /* ' */ // it's\n"
                               "double lifetime(int); double t = lifetime(0); auto u = x.time(0);\n"
        })
        self.assertEqual(tree.check()[0], 0, tree.check()[1])


class Findings(unittest.TestCase):
    def finds(self, path, include, *words, line=None):
        """With this one line more, the clean tree fails at that line with these words."""
        files = dict(CLEAN)
        files[path] = files.get(path, "") + include + "\n"
        tree = Tree(files)
        status, lines = tree.check()
        self.assertEqual(status, 1, f"{path}: {include} was not found")
        self.assertEqual(len(lines), 1, lines)
        expected = tree.files[path].count("\n") if line is None else line
        self.assertTrue(lines[0].startswith(f"{path}:{expected}: "), lines[0])
        for word in words:
            self.assertIn(word, lines[0])

    def test_each_core_folder_includes_only_those_below_it(self):
        headers = {"text": "text/fault.h", "units": "units/quantity.h", "chem": "chem/formula.h",
                   "charge": "charge/plan.h", "gas": "gas/ledger.h", "light": "light/flux.h",
                   "course": "course/fit.h", "quench": "quench/shares.h",
                   "stats": "stats/line.h", "app": "app/close_run.h"}
        order = ["text", "units", "stats", "chem", "charge", "gas", "light", "app"]
        pairs = [(low, high) for i, low in enumerate(order) for high in order[i + 1:]]
        side = ["light", "course", "quench"]
        pairs += [(a, b) for a in side for b in side if a != b]
        for low, high in pairs:
            with self.subTest(including=low, included=high):
                self.finds(f"src/{low}/more.cpp", f'#include "{headers[high]}"',
                           f"{low} may not include {high}: move")

    def test_the_core_includes_nothing_above_it(self):
        for header, layer in (("db/book.h", "db"), ("exports/sheet.h", "exports"),
                              ("ui/models/runs.h", "ui/models"), ("ui/widgets/runs.h", "ui/widgets"),
                              ("cli/main.cpp", "cli")):
            with self.subTest(included=layer):
                self.finds("src/course/more.cpp", f'#include "{header}"',
                           f"course may not include {layer}")

    def test_the_core_uses_no_library_but_its_own(self):
        for header, library in (
            ("QString", "QtCore"), ("QtCore/QString", "QtCore"), ("qstring.h", "QtCore"),
            ("QLabel", "another Qt module"), ("QtWidgets/QLabel", "another Qt module"),
            ("QtGui/QPainter", "QtGui"), ("sqlite3.h", "SQLite"),
            ("SQLiteCpp/SQLiteCpp.h", "SQLite"), ("ctime", "clock"), ("time.h", "clock"),
            ("locale", "locale"), ("clocale", "locale"), ("locale.h", "locale"),
            ("sodium.h", "libsodium"), ("nlohmann/json.hpp", "nlohmann-json"),
            ("CLI/CLI.hpp", "CLI11"), ("catch2/catch.hpp", "Catch2"),
            ("unistd.h", "the system's interface"), ("GraphMol/GraphMol.h", "RDKit"),
            ("rdkit/GraphMol/ROMol.h", "RDKit"), ("inchi_api.h", "InChI"),
        ):
            for layer in ("units", "gas"):
                with self.subTest(header=header, layer=layer):
                    self.finds(f"src/{layer}/more.cpp", f"#include <{header}>",
                               f"{layer} may not use {library}: move")

    def test_rdkit_stays_in_its_folder(self):
        self.finds("src/chem/more.cpp", "#include <GraphMol/GraphMol.h>", "chem may not use RDKit")
        self.finds("src/chem/more.cpp", '#include "chem/rdkit/reader.h"',
                   "chem may not include chem/rdkit")
        self.finds("src/chem/rdkit/structure_module.h", "#include <GraphMol/GraphMol.h>",
                   "chem may not use RDKit")

    def test_only_chem_loads_modules_in_the_core(self):
        self.finds("src/gas/more.cpp", "#include <dlfcn.h>", "gas may not use the module loader")

    def test_the_core_reads_neither_clock_nor_locale(self):
        for use in ("auto t = std::chrono::system_clock::now();",
                    "using clock = std::chrono::steady_clock;", "auto t = std::time(nullptr);",
                    "auto t = ::time(&x);", "auto t = time(0);", "auto t = time (NULL);",
                    "std::locale here;", 'setlocale(LC_ALL, "");', "std::setlocale(0, x);",
                    "out.imbue(x);", "localtime(&t);"):
            with self.subTest(use=use):
                self.finds("src/course/more.cpp", use, "course may not use the ")

    def test_app_uses_neither_qt_nor_sql_nor_what_is_above(self):
        for include, words in (("<QString>", "QtCore"), ("<sqlite3.h>", "SQLite"),
                               ("<SQLiteCpp/Database.h>", "SQLite"), ('"db/book.h"', "db"),
                               ('"exports/sheet.h"', "exports"), ('"cli/main.cpp"', "cli"),
                               ('"ui/models/runs.h"', "ui/models"), ("<CLI/CLI.hpp>", "CLI11")):
            with self.subTest(include=include):
                self.finds("src/app/more.cpp", f"#include {include}", "app may not", words)

    def test_db_uses_neither_qt_nor_exports_nor_ui(self):
        for include, words in (("<QString>", "QtCore"), ('"exports/sheet.h"', "exports"),
                               ('"ui/models/runs.h"', "ui/models"), ('"cli/main.cpp"', "cli"),
                               ('"../src/cli/main.cpp"', "cli")):
            with self.subTest(include=include):
                self.finds("db/more.cpp", f"#include {include}", "db may not", words)

    def test_exports_use_neither_db_nor_widgets(self):
        for include, words in (('"db/book.h"', "db"), ("<QLabel>", "another Qt module"),
                               ("<QtWidgets/QLabel>", "another Qt module"),
                               ("<QtCharts/QChart>", "another Qt module"),
                               ("<sqlite3.h>", "SQLite"), ('"ui/charts/plot.h"', "ui/charts"),
                               ('"cli/main.cpp"', "cli")):
            with self.subTest(include=include):
                self.finds("exports/more.cpp", f"#include {include}", "exports may not", words)

    def test_view_models_use_qtcore_only(self):
        for include, words in (("<QPainter>", "QtGui"), ("<QColor>", "QtGui"),
                               ("<QTableView>", "another Qt module"), ('"db/book.h"', "db"),
                               ('"exports/sheet.h"', "exports"), ('"widgets/runs.h"', "ui/widgets"),
                               ('"../charts/plot.h"', "ui/charts"), ("<sqlite3.h>", "SQLite")):
            with self.subTest(include=include):
                self.finds("ui/models/more.cpp", f"#include {include}", "ui/models may not", words)

    def test_widgets_and_charts_use_no_database(self):
        for layer in ("ui/widgets", "ui/charts"):
            for include, words in (('"db/book.h"', "db"), ("<sqlite3.h>", "SQLite"),
                                   ("<SQLiteCpp/SQLiteCpp.h>", "SQLite"),
                                   ('"cli/main.cpp"', "cli")):
                with self.subTest(layer=layer, include=include):
                    self.finds(f"{layer}/more.cpp", f"#include {include}", f"{layer} may not", words)

    def test_the_command_line_uses_neither_ui_nor_qt(self):
        for include, words in (('"ui/models/runs.h"', "ui/models"), ("<QString>", "QtCore"),
                               ('"ui/widgets/runs.h"', "ui/widgets")):
            with self.subTest(include=include):
                self.finds("src/cli/more.cpp", f"#include {include}", "cli may not", words)

    def test_the_command_line_gets_no_qt_through_a_header_of_exports(self):
        self.finds("src/cli/more.cpp", '#include "exports/page.h"', "behind which stands <QPainter>",
                   "cli may not use Qt: keep Qt out of exports/page.h")

    def test_tests_include_what_they_test_and_what_that_may(self):
        for path, include, words in (
            ("tests/gas/more_test.cpp", '"course/fit.h"', "tests of gas may not include course"),
            ("tests/src/gas/more_test.cpp", '"app/close_run.h"', "tests of gas may not include app"),
            ("tests/gas/more_test.cpp", "<QString>", "tests of gas may not use QtCore"),
            ("tests/db/more_test.cpp", '"exports/sheet.h"', "tests of db may not include exports"),
            ("tests/exports/more_test.cpp", "<QLabel>", "tests of exports may not use another Qt"),
            ("tests/ui/models/more_test.cpp", '"ui/widgets/runs.h"', "may not include ui/widgets"),
            ("tests/catch_compat.h", '"gas/ledger.h"', "tests may not include gas"),
        ):
            with self.subTest(path=path, include=include):
                self.finds(path, f"#include {include}", words)

    def test_nothing_but_tests_includes_tests(self):
        self.finds("src/gas/more.cpp", '#include "tests/catch_compat.h"', "gas may not include tests")

    def test_unknown_folders_and_libraries_are_findings(self):
        self.finds("src/helpers/more.cpp", "int x;", "src/helpers/ is in no layer: add", line=1)
        self.finds("ui/dialogs/more.cpp", "int x;", "ui/dialogs/ is in no layer", line=1)
        self.finds("tests/helpers/more.cpp", "int x;", "tests/helpers/ is in no layer", line=1)
        self.finds("src/more.cpp", "int x;", "src/ is in no layer", line=1)
        self.finds("src/gas/more.cpp", "#include <curl/curl.h>", "nor a known library: correct it")
        self.finds("src/gas/more.cpp", '#include "gone.h"', "nor a known library: correct it")
        self.finds("src/gas/more.cpp", "#include LEDGER_H", "write the header's name")

    def test_an_include_is_seen_however_it_is_written(self):
        for include in ("  #  include   <QString>", "#include<QString> // no", "%:include <QString>",
                        "#include /**/ <QString>", "#include_next <QString>",
                        "/* so */ #include <QString>"):
            with self.subTest(include=include):
                self.finds("src/gas/more.cpp", include, "gas may not use QtCore")

    def test_line_numbers_count_comments_and_texts(self):
        self.finds("src/gas/more.cpp", '/*\n\n*/ const char* a = R"(\n\n)";\n#include <QString>',
                   "gas may not use QtCore")

    def test_headers_have_pragma_once(self):
        for text in ("", "// #pragma once\n"):
            tree = Tree({})
            tree.files["src/gas/more.h"] = HEAD + text
            status, lines = tree.check()
            self.assertEqual(status, 1)
            self.assertEqual(lines, ["src/gas/more.h:1: is a header without #pragma once: add it "
                                     "below the SPDX lines"])

    def test_files_begin_with_the_spdx_lines(self):
        for head in ("", "\n" + HEAD, HEAD.splitlines()[0] + "\n", HEAD.replace("GPL-3", "GPL-2")):
            tree = Tree({"src/gas/more.h": "", "src/gas/more.cpp": ""}, head)
            status, lines = tree.check()
            self.assertEqual(status, 1)
            self.assertEqual(len(lines), 2, lines)
            for line in lines:
                self.assertIn(":1: lacks the two SPDX lines", line)

    def test_other_endings_do_not_escape_the_check(self):
        tree = Tree({"src/gas/more.cpp": "", "src/gas/more.hpp": "#include <QString>\n"})
        status, lines = tree.check()
        self.assertEqual((status, lines), (1, [
            "src/gas/more.hpp:1: is C++ under another ending: call it .h or .cpp"]))

    def test_a_file_in_another_encoding_is_told(self):
        tree = Tree({})
        tree.files["src/gas/more.cpp"] = HEAD.encode() + b"// \xb5\n"
        status, lines = tree.check()
        self.assertEqual((status, lines), (1, ["src/gas/more.cpp:1: is not UTF-8: save it as UTF-8"]))


if __name__ == "__main__":
    unittest.main()
