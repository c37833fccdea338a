// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/pages.h"

#include <algorithm>
#include <catch2/catch.hpp>
#include <clocale>
#include <cmath>
#include <filesystem>
#include <set>

#include "exports/printed_page.h"
#include "exports/sample_sheets.h"

using namespace vialkeeper;
using namespace vialkeeper::exports;

namespace {

PdfDocument printed(const app::SheetContent& content, Paper paper = Paper::kA4) {
  auto document = printWeighingSheet(content, paper);
  if (!document) FAIL(text::toLine(document.error().front()));
  return *document;
}

PdfDocument printed(const std::vector<app::StockSheetContent>& contents, Paper paper = Paper::kA4) {
  auto document = printStockSheets(contents, paper);
  if (!document) FAIL(text::toLine(document.error().front()));
  return *document;
}

PdfDocument printed(const std::vector<app::LabelContent>& contents) {
  auto document = printVialLabels(contents);
  if (!document) FAIL(text::toLine(document.error().front()));
  return *document;
}

/// Every text of a weighing sheet that has to be found on paper.
std::vector<std::string> textsOf(const app::SheetContent& sheet) {
  std::vector<std::string> texts{sheet.title, sheet.code,    sheet.series,
                                 sheet.date,  sheet.chemist, sheet.footer};
  const auto add = [&texts](const std::vector<std::string>& more) {
    texts.insert(texts.end(), more.begin(), more.end());
  };
  for (const auto& member : sheet.scheme.reactants) texts.push_back(member.label);
  for (const auto& member : sheet.scheme.products) texts.push_back(member.label);
  add(sheet.scheme.gases);
  add(sheet.scheme.above);
  add(sheet.scheme.below);
  for (const app::SheetRow& row : sheet.rows) {
    add({row.name, row.role, row.cas, row.molarMass, row.amount, row.supply, row.ratio, row.device,
         row.target + row.unit, row.alternative, row.tolerance, row.actual});
    add(row.notices);
  }
  add(sheet.notices);
  add(sheet.vial.lines);
  if (sheet.vial.forecast) {
    add({sheet.vial.forecast->headline, sheet.vial.forecast->verdict});
    add(sheet.vial.forecast->lines);
  }
  for (const app::HazardContent& hazard : sheet.hazards) {
    texts.push_back(hazard.name);
    add(hazard.statements);
  }
  add(sheet.cautions);
  return texts;
}

std::vector<std::string> textsOf(const app::StockSheetContent& stock) {
  std::vector<std::string> texts{stock.title,
                                 stock.forRun,
                                 stock.code,
                                 stock.name,
                                 stock.cas,
                                 stock.molarMass,
                                 stock.assay,
                                 stock.concentration,
                                 stock.solvent,
                                 stock.flask,
                                 stock.target + stock.unit,
                                 stock.tolerance,
                                 stock.transfer,
                                 stock.serves,
                                 stock.formula,
                                 stock.footer};
  texts.insert(texts.end(), stock.steps.begin(), stock.steps.end());
  texts.insert(texts.end(), stock.notices.begin(), stock.notices.end());
  texts.insert(texts.end(), stock.cautions.begin(), stock.cautions.end());
  for (const app::HazardContent& hazard : stock.hazards) {
    texts.push_back(hazard.name);
    texts.insert(texts.end(), hazard.statements.begin(), hazard.statements.end());
  }
  return texts;
}

void checkTexts(const PrintedPages& pages, const std::vector<std::string>& texts) {
  const std::string all = pages.squeezedText();
  for (const std::string& text : texts) {
    INFO(text);
    CHECK(all.find(squeezed(text)) != std::string::npos);
  }
}

/// All words within the margins (14 mm at the sides, 12 above, 10 below; half a millimetre is
/// what a font may reach beyond its own measures).
void checkMargins(const std::vector<Word>& words, Paper paper) {
  constexpr double kPointsPerMm = 72.0 / 25.4;
  const double width = (paper == Paper::kA4 ? 210.0 : 215.9) * kPointsPerMm;
  const double height = (paper == Paper::kA4 ? 297.0 : 279.4) * kPointsPerMm;
  for (const Word& word : words) {
    INFO(word.text << " on page " << word.page + 1);
    CHECK(word.left >= 13.5 * kPointsPerMm);
    CHECK(word.right <= width - 13.5 * kPointsPerMm);
    CHECK(word.top >= 11.5 * kPointsPerMm);
    CHECK(word.bottom <= height - 9.5 * kPointsPerMm);
  }
}

/// No two words on top of each other. A word's box is as high as its font's tallest letters, so
/// that the boxes of two lines touch: the middle 60 % of the height is what is compared.
void checkOverlaps(const std::vector<Word>& words) {
  const auto trim = [](const Word& word) { return 0.2 * (word.bottom - word.top); };
  for (std::size_t i = 0; i < words.size(); ++i) {
    for (std::size_t j = i + 1; j < words.size(); ++j) {
      const Word& a = words[i];
      const Word& b = words[j];
      if (a.page != b.page) continue;
      const double across = std::min(a.right, b.right) - std::max(a.left, b.left);
      const double down = std::min(a.bottom - trim(a), b.bottom - trim(b)) -
                          std::max(a.top + trim(a), b.top + trim(b));
      if (across > 0.3 && down > 0.0)
        FAIL_CHECK(a.text << " lies on " << b.text << ", page " << a.page + 1);
    }
  }
}

void checkFile(const PrintedPages& pages, const PdfDocument& document, const std::string& size) {
  const std::string info = pages.output("pdfinfo %");
  CHECK_THAT(info, Catch::Contains(size));
  CHECK_THAT(info, Catch::Matches("[^]*Pages: +" + std::to_string(document.pages) + "\n[^]*"));
  const std::string fonts = pages.output("pdffonts % | tail -n +3");
  CHECK_FALSE(fonts.empty());
  // Columns: name, type, encoding, embedded, subset (judged by the name only), with Unicode.
  CHECK_THAT(fonts, Catch::Matches("([^\n]+Identity-H +yes [a-z ]+ yes +[0-9]+ +0\n)+"));
  const std::string images = pages.output("pdfimages -list % | tail -n +3");
  CHECK(images == "");
}

void checkPages(const PdfDocument& document, Paper paper, const std::vector<std::string>& texts) {
  const PrintedPages pages(document);
  const std::vector<Word> words = pages.words();
  checkTexts(pages, texts);
  checkMargins(words, paper);
  checkOverlaps(words);
  checkFile(pages, document, paper == Paper::kA4 ? "595 x 842 pts (A4)" : "612 x 792 pts (letter)");
}

/// All words on the label of 62 mm × 29 mm, 1 mm from its edges, and none in the white that a
/// printed code of so many modules has to have on all sides.
void checkLabelWords(const std::vector<Word>& words, double qrSide_mm, int qrModules) {
  constexpr double kPointsPerMm = 72.0 / 25.4;
  const double qrEnd = qrSide_mm * (1.0 + 8.0 / qrModules) * kPointsPerMm;
  for (const Word& word : words) {
    INFO(word.text << " on label " << word.page + 1);
    CHECK(word.left >= 1.0 * kPointsPerMm);
    CHECK(word.right <= 61.0 * kPointsPerMm);
    CHECK(word.top >= 0.5 * kPointsPerMm);  // the box is higher than the letters
    CHECK(word.bottom <= 28.3 * kPointsPerMm);
    CHECK((word.left >= qrEnd - 0.5 || word.bottom >= qrEnd + 1.5));
  }
  checkOverlaps(words);
}

/// The page on which a word stands, from 0; -1 where it does not, or more than once.
int pageOf(const std::vector<Word>& words, const std::string& text) {
  int page = -1;
  for (const Word& word : words) {
    if (!word.text.starts_with(text)) continue;
    if (page >= 0) return -1;
    page = word.page;
  }
  return page;
}

/// A sheet whose every optional text is there, with all kinds of characters.
app::SheetContent greekSheet() {
  app::SheetContent sheet = samples::typicalSheet();
  sheet.title = "β-Carboline, λ = 440 nm: Δp → H₂, κ² at 25 °C, ±½ µmol, “fluffy office” Å";
  sheet.rows[0].name = "[Ni(κ²-N,N′-dtbbpy)Br₂]·½H₂O";
  sheet.rows[1].name = "α-(¹³C)-N-methyl-Δ⁹-indoline";
  sheet.vial.forecast =
      app::ForecastContent{"0.79 bar at full conversion, 35 °C",
                           "limit 1.00 bar (rated 2.0 × 0.5): within",
                           {"headspace would be 41 % hydrogen: open in the hood"}};
  return sheet;
}

}  // namespace

TEST_CASE("a typical weighing sheet is one sound page on either paper", "[exports][independent]") {
  const Paper paper = GENERATE(Paper::kA4, Paper::kLetter);
  const app::SheetContent sheet = samples::typicalSheet();
  const PdfDocument document = printed(sheet, paper);
  CHECK(document.pages == 1);
  checkPages(document, paper, textsOf(sheet));
  checkTexts(PrintedPages(document), {"weighed by", "lamp on at", "start pressure", "page 1 of 1"});
}

TEST_CASE("Greek letters, sub- and superscripts and the forecast are printed",
          "[exports][independent]") {
  const app::SheetContent sheet = greekSheet();
  checkPages(printed(sheet), Paper::kA4, textsOf(sheet));
}

TEST_CASE("a sheet with next to nothing on it invents nothing", "[exports][independent]") {
  const app::SheetContent sheet = samples::bareSheet();
  const PdfDocument document = printed(sheet, Paper::kLetter);
  CHECK(document.pages == 1);
  checkPages(document, Paper::kLetter, textsOf(sheet));
  const std::string text = PrintedPages(document).squeezedText();
  for (const char* absent : {"Vial", "Cautions", "Hazards", "series", "±", "bar"}) {
    INFO(absent);
    CHECK(text.find(absent) == std::string::npos);
  }
  CHECK(text.find("chemist") != std::string::npos);
}

TEST_CASE("a weighing sheet of 25 long rows breaks between rows", "[exports][independent]") {
  const Paper paper = GENERATE(Paper::kA4, Paper::kLetter);
  const app::SheetContent sheet = samples::hugeSheet();
  const PdfDocument document = printed(sheet, paper);
  CHECK(document.pages >= 3);
  CHECK(document.pages <= 8);
  checkPages(document, paper, textsOf(sheet));

  const std::vector<Word> words = PrintedPages(document).words();
  int before = 0;
  for (int i = 0; i < 25; ++i) {
    const std::string number = (i < 10 ? "0" : "") + std::to_string(i);
    INFO("row " << number);
    const int page = pageOf(words, "row" + number);
    CHECK(page >= before);
    before = page;
    for (std::size_t n = 0; n < sheet.rows[static_cast<std::size_t>(i)].notices.size(); ++n) {
      CHECK(pageOf(words, "note" + number + (n < 10 ? "0" : "") + std::to_string(n)) == page);
    }
  }
}

TEST_CASE("every later page has the running head, the table's head and its number",
          "[exports][independent]") {
  const app::SheetContent sheet = samples::hugeSheet();
  const PdfDocument document = printed(sheet);
  const PrintedPages pages(document);
  for (int page = 1; page <= document.pages; ++page) {
    const std::string number = std::to_string(page);
    const std::string text =
        squeezed(pages.output("pdftotext -raw -f " + number + " -l " + number + " % -"));
    INFO("page " << page);
    CHECK(text.find("KW0042") != std::string::npos);
    CHECK(text.find("Surveyofβcarbolines") != std::string::npos);
    CHECK(text.find("page" + number + "of" + std::to_string(document.pages)) != std::string::npos);
    const bool hasRows = text.find("row0") != std::string::npos ||
                         text.find("row1") != std::string::npos ||
                         text.find("row2") != std::string::npos;
    CHECK(hasRows == (text.find("donecomponentsupplyratiotargetactual") != std::string::npos));
  }
}

TEST_CASE("the printed code is read back by a scanner", "[exports][independent]") {
  for (const std::string& code : {std::string("KW-0042"), std::string("plan 3f9a2c1b"),
                                  std::string("urn:uuid:0190f3a2-7c1e-7b5d-9d3e-5f6a7b8c9d0e"),
                                  std::string("stock 2.0 mM 4CzIPN ") + std::string(160, 'x')}) {
    app::SheetContent sheet = samples::typicalSheet();
    sheet.qrText = code;
    INFO(code);
    CHECK(PrintedPages(printed(sheet)).scannedCode(1) == code + "\n");
  }
}

TEST_CASE("structures are drawn, and names stand where there is none", "[exports][identity]") {
  app::SheetContent sheet = samples::typicalSheet();
  const std::size_t drawn = printed(sheet).bytes.size();
  sheet.scheme.reactants[0].smiles.clear();
  sheet.scheme.products[0].smiles.clear();
  const PdfDocument named = printed(sheet);
  CHECK(named.bytes.size() + 300 < drawn);
  checkPages(named, Paper::kA4, textsOf(sheet));
  sheet.scheme = {};
  checkPages(printed(sheet), Paper::kA4, textsOf(sheet));
}

TEST_CASE("a scheme wider than the page is set on more lines", "[exports][independent]") {
  app::SheetContent sheet = samples::typicalSheet();
  for (int i = 0; i < 9; ++i) {
    sheet.scheme.reactants.push_back(
        {"", "partner number " + std::to_string(i) + " with a longish name"});
    sheet.scheme.above.push_back("additive number " + std::to_string(i) +
                                 ", of a name that takes two lines of the arrow");
  }
  for (int i = 0; i < 9; ++i)
    sheet.scheme.products.push_back({"CC(C)(C)c1ccc2[nH]ccc2c1", "product " + std::to_string(i)});
  checkPages(printed(sheet), Paper::kA4, textsOf(sheet));
}

TEST_CASE("texts longer than a page lose nothing", "[exports][independent]") {
  std::vector<std::string> allWords;
  const auto essay = [&allWords](const std::string& word, int words) {
    std::string text;
    for (int i = 0; i < words; ++i) {
      allWords.push_back(word + std::to_string(i) + "x");
      text += allWords.back() + " ";
    }
    return text;
  };
  app::SheetContent sheet = samples::bareSheet();
  sheet.title = essay("title", 120);
  sheet.rows[0].name = essay("name", 900);
  sheet.rows[0].notices = {essay("notice", 900)};
  sheet.cautions.assign(1, essay("caution", 1200));
  sheet.hazards = {{"everything", {essay("hazard", 900)}}};
  sheet.footer = essay("footer", 40);
  checkPages(printed(sheet), Paper::kA4, allWords);
}

TEST_CASE("the drawn liquid grows with the fill", "[exports][identity]") {
  app::SheetContent sheet = samples::typicalSheet();
  const auto liquid = [&sheet](double fill) {
    sheet.vial.fill = fill;
    return static_cast<double>(PrintedPages(printed(sheet)).pixelsOf(0xF1, 0xDC, 0xAE));
  };
  CHECK(liquid(0.0) == 0.0);
  CHECK(liquid(std::nan("")) == 0.0);
  const double fifth = liquid(0.2);
  CHECK(fifth > 500.0);
  // In the straight part of the vial equal volumes are equally high; the stir bar covers a little.
  CHECK(liquid(0.4) - fifth == Approx(liquid(0.6) - liquid(0.4)).epsilon(0.05));
}

TEST_CASE("a stock sheet is one sound page on either paper", "[exports][independent]") {
  const Paper paper = GENERATE(Paper::kA4, Paper::kLetter);
  const app::StockSheetContent stock = samples::typicalStock();
  const PdfDocument document = printed(std::vector{stock}, paper);
  CHECK(document.pages == 1);
  checkPages(document, paper, textsOf(stock));
  const PrintedPages pages(document);
  checkTexts(pages, {"H413 · H225 · H302 + H312 + H332 · H319", "initials", "made by"});
  CHECK(pages.scannedCode(1) == stock.qrText + "\n");
}

TEST_CASE("long stock sheets go on, and each begins on a page of its own",
          "[exports][independent]") {
  const app::StockSheetContent huge = samples::hugeStock();
  const app::StockSheetContent typical = samples::typicalStock();
  const PdfDocument document = printed(std::vector{huge, typical});
  CHECK(document.pages >= 3);
  std::vector<std::string> texts = textsOf(huge);
  for (const std::string& text : textsOf(typical)) texts.push_back(text);
  checkPages(document, Paper::kA4, texts);
  CHECK(PrintedPages(document).scannedCode(document.pages) == typical.qrText + "\n");
}

TEST_CASE("a run with notices and hazards as they come is one page", "[exports][independent]") {
  const Paper paper = GENERATE(Paper::kA4, Paper::kLetter);
  app::SheetContent sheet = samples::templateSheet();
  const PdfDocument document = printed(sheet, paper);
  CHECK(document.pages == 1);
  checkPages(document, paper, textsOf(sheet));
  sheet.vial.forecast = greekSheet().vial.forecast;
  const PdfDocument withForecast = printed(sheet, paper);
  if (paper == Paper::kA4) CHECK(withForecast.pages == 1);
  checkPages(withForecast, paper, textsOf(sheet));
}

TEST_CASE("hazards that have no room go on alone", "[exports][independent]") {
  app::SheetContent sheet = samples::templateSheet();
  for (int i = 0; i < 6; ++i) sheet.hazards.push_back(sheet.hazards[3]);
  const PdfDocument document = printed(sheet);
  CHECK(document.pages == 2);
  checkPages(document, Paper::kA4, textsOf(sheet));
  const std::vector<Word> words = PrintedPages(document).words();
  CHECK(pageOf(words, "Cautions") == 0);
  CHECK(pageOf(words, "Hazards") == 1);
  CHECK(pageOf(words, "Notes") == 1);
}

TEST_CASE("a label has its size, all its texts and a code to scan", "[exports][independent]") {
  const app::LabelContent first = samples::typicalLabel();
  app::LabelContent second = first;
  second.code = second.qrText = "plan 32e6253f";
  second.person.clear();
  second.date.clear();
  const PdfDocument document = printed(std::vector{first, second});
  CHECK(document.pages == 2);
  const PrintedPages pages(document);
  for (const app::LabelContent& label : {first, second}) {
    checkTexts(pages, {label.code, label.title, label.lines[0], label.lines[1], label.conditions,
                       label.hazards, label.caution, label.person, label.date});
  }
  const std::vector<Word> words = pages.words();
  CHECK(pageOf(words, "by") == 1);
  CHECK(pageOf(words, "date") == 1);
  checkLabelWords(words, 12.0, 21);
  checkFile(pages, document, "175.748 x 82.2047 pts");  // 62 mm × 29 mm
  CHECK(pages.scannedCode(1) == "KW-0042\n");
  CHECK(pages.scannedCode(2) == "plan 32e6253f\n");
  CHECK(document.bytes == printed(std::vector{first, second}).bytes);
}

TEST_CASE("a label is black and white", "[exports][identity]") {
  const PrintedPages pages(printed(std::vector{samples::typicalLabel()}));
  const std::string picture = pages.output("pdftoppm -r 300 -aa no -aaVector no %");
  const std::size_t start = picture.find("255\n") + 4;
  const auto isPure = [](char c) { return c == '\0' || c == '\xFF'; };
  CHECK(std::all_of(picture.begin() + static_cast<std::ptrdiff_t>(start), picture.end(), isPure));
}

TEST_CASE("a label's contents are cut before anything else", "[exports][independent]") {
  const app::LabelContent label = samples::hugeLabel();
  const PdfDocument document = printed(std::vector{label});
  CHECK(document.pages == 1);
  const PrintedPages pages(document);
  checkTexts(pages, {label.code, label.conditions, label.hazards, label.caution, label.date, "…"});
  checkLabelWords(pages.words(), 13.2, 33);
  CHECK(pages.scannedCode(1) == label.qrText + "\n");
}

TEST_CASE("a label sets its code larger where there is room", "[exports][identity]") {
  const auto codeHeight = [](const app::LabelContent& label) {
    const std::vector<Word> words = PrintedPages(printed(std::vector{label})).words();
    const auto code = std::ranges::find(words, label.code, &Word::text);
    return code == words.end() ? 0.0 : code->bottom - code->top;
  };
  app::LabelContent label = samples::typicalLabel();
  const double full = codeHeight(label);
  CHECK(full >= 12.0);  // points: letters of 3 mm, to be read from 60 cm with ease
  label.lines.clear();
  label.hazards.clear();
  CHECK(codeHeight(label) > 1.1 * full);
}

TEST_CASE("what no label can hold is a fault", "[exports]") {
  CHECK_FALSE(printVialLabels({}));
  app::LabelContent label = samples::typicalLabel();
  label.qrText = std::string(400, 'x');
  const auto longCode = printVialLabels({label});
  REQUIRE_FALSE(longCode);
  CHECK_THAT(longCode.error().front().what, Catch::Contains("printed code"));
  label = samples::typicalLabel();
  for (int i = 0; i < 40; ++i) label.caution += " and again";
  const auto longCaution = printVialLabels({label});
  REQUIRE_FALSE(longCaution);
  CHECK_THAT(longCaution.error().front().what, Catch::Contains("caution"));
  CHECK_THAT(longCaution.error().front().what, Catch::Contains("KW-0042"));
  CHECK_FALSE(longCaution.error().front().mend.empty());
  app::LabelContent empty;
  CHECK(printVialLabels({empty}));
}

TEST_CASE("the same content gives the same bytes", "[exports][identity]") {
  const app::SheetContent sheet = samples::typicalSheet();
  const PdfDocument first = printed(sheet);
  CHECK(first.bytes == printed(sheet).bytes);
  CHECK(first.bytes.find("CreationDate") == std::string::npos);
}

TEST_CASE("what cannot be printed is told with its remedy", "[exports]") {
  app::SheetContent sheet = samples::typicalSheet();
  sheet.scheme.reactants[0].smiles = "C1CC";
  sheet.scheme.products[0].smiles = "not a structure";
  const auto badStructures = printWeighingSheet(sheet, Paper::kA4);
  REQUIRE_FALSE(badStructures);
  CHECK(badStructures.error().size() == 2);
  CHECK_THAT(badStructures.error().front().what, Catch::Contains("indoline"));

  sheet = samples::typicalSheet();
  sheet.qrText = std::string(2400, 'x');
  const auto longCode = printWeighingSheet(sheet, Paper::kA4);
  REQUIRE_FALSE(longCode);
  CHECK_THAT(longCode.error().front().what, Catch::Contains("2400"));
  CHECK_FALSE(longCode.error().front().mend.empty());

  CHECK_FALSE(printStockSheets({}, Paper::kA4));
}

// Run by the cases below in a process of its own, where nothing has been loaded yet.
TEST_CASE("child: print quietly", "[.child-print]") {
  std::setlocale(LC_NUMERIC, "C");
  const std::string before = std::setlocale(LC_ALL, nullptr);
  CHECK(printWeighingSheet(samples::bareSheet(), Paper::kA4));
  CHECK(std::setlocale(LC_ALL, nullptr) == before);
}

TEST_CASE("child: no module", "[.child-no-module]") {
  const auto document = printWeighingSheet(samples::bareSheet(), Paper::kA4);
  REQUIRE_FALSE(document);
  REQUIRE(document.error().size() == 1);
  CHECK_THAT(document.error().front().what, Catch::Contains("vialkeeper_pages.so is not in /"));
  CHECK(document.error().front().mend == "correct or unset VIALKEEPER_MODULE_DIR");
}

TEST_CASE("child: no font", "[.child-no-font]") {
  const auto document = printWeighingSheet(samples::bareSheet(), Paper::kA4);
  REQUIRE_FALSE(document);
  CHECK_THAT(document.error().front().what, Catch::Contains("no font is installed"));
}

TEST_CASE("a system without fonts is a fault, not a page of boxes", "[exports]") {
  const std::string self = std::filesystem::read_symlink("/proc/self/exe").string();
  const PrintedPages folder(PdfDocument{});
  const std::string said = folder.output(
      "echo '<fontconfig><cachedir>@</cachedir></fontconfig>' >@/fonts.conf; "
      "FONTCONFIG_FILE=@/fonts.conf '" +
      self + "' '[.child-no-font]' 2>&1");
  CHECK_THAT(said, Catch::Contains("All tests passed"));
}

TEST_CASE("loading the pages says nothing and keeps the locale", "[exports]") {
  const std::string self = std::filesystem::read_symlink("/proc/self/exe").string();
  const PrintedPages folder(PdfDocument{});
  const std::string said =
      folder.output("env -u XDG_RUNTIME_DIR -u QT_QPA_PLATFORM LC_ALL=C.UTF-8 '" + self +
                    "' '[.child-print]' 2>&1 >@/out; grep -o 'All tests passed' @/out");
  CHECK(said == "All tests passed\n");
}

TEST_CASE("a missing pages module is a fault that says where it was sought", "[exports]") {
  const std::string self = std::filesystem::read_symlink("/proc/self/exe").string();
  const PrintedPages folder(PdfDocument{});
  const std::string said =
      folder.output("VIALKEEPER_MODULE_DIR=@ '" + self + "' '[.child-no-module]' 2>&1");
  CHECK_THAT(said, Catch::Contains("All tests passed"));
}

TEST_CASE("the pages as pictures have the paper's size and hold what the PDF holds",
          "[exports][identity]") {
  const auto pictures = paintWeighingSheet(samples::typicalSheet(), Paper::kA4, 96.0);
  REQUIRE(pictures);
  CHECK(static_cast<int>(pictures->size()) == printed(samples::typicalSheet()).pages);
  for (const PagePicture& picture : *pictures) {
    CHECK(picture.width_px == 794);
    CHECK(picture.height_px == 1123);
    CHECK(picture.rgb.size() == std::size_t{794} * 1123 * 3);
    const auto dark = std::ranges::count_if(
        picture.rgb, [](char c) { return static_cast<unsigned char>(c) < 80; });
    // Some per cent of a printed page is ink.
    CHECK(dark > static_cast<std::ptrdiff_t>(picture.rgb.size() / 200));
    CHECK(dark < static_cast<std::ptrdiff_t>(picture.rgb.size() / 4));
  }
  const auto labels = paintVialLabels({samples::typicalLabel()}, 300.0);
  REQUIRE(labels);
  REQUIRE(labels->size() == 1);
  CHECK(labels->front().width_mm == Approx(62.0));
  CHECK_FALSE(paintVialLabels({}, 300.0));
}
