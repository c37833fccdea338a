// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/printed_page.h"

#include <cstdio>
#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <regex>
#include <stdexcept>

namespace vialkeeper::exports {
namespace {

void replaceAll(std::string& text, const std::string& from, const std::string& to) {
  for (std::size_t at = text.find(from); at != std::string::npos;
       at = text.find(from, at + to.size())) {
    text.replace(at, from.size(), to);
  }
}

}  // namespace

PrintedPages::PrintedPages(const PdfDocument& document) {
  std::string pattern =
      (std::filesystem::temp_directory_path() / "vialkeeper-pages-XXXXXX").string();
  if (mkdtemp(pattern.data()) == nullptr) throw std::runtime_error("no temporary folder");
  m_folder = pattern;
  std::ofstream(m_folder + "/sheet.pdf", std::ios::binary) << document.bytes;
}

PrintedPages::~PrintedPages() {
  std::error_code ignored;
  std::filesystem::remove_all(m_folder, ignored);
}

std::string PrintedPages::output(std::string command) const {
  replaceAll(command, "%", m_folder + "/sheet.pdf");
  replaceAll(command, "@", m_folder);
  std::FILE* pipe = popen(command.c_str(), "r");
  if (pipe == nullptr) throw std::runtime_error("cannot run " + command);
  std::string text;
  char buffer[4096];
  for (std::size_t n = 0; (n = std::fread(buffer, 1, sizeof buffer, pipe)) > 0;)
    text.append(buffer, n);
  if (pclose(pipe) != 0) throw std::runtime_error("failed: " + command + "\n" + text);
  return text;
}

std::vector<Word> PrintedPages::words() const {
  const std::string html = output("pdftotext -bbox % -");
  static const std::regex kElement(
      "<page |<word xMin=\"([-0-9.]+)\" yMin=\"([-0-9.]+)\" xMax=\"([-0-9.]+)\" "
      "yMax=\"([-0-9.]+)\">"
      "([^<]*)</word>");
  std::vector<Word> words;
  int page = -1;
  for (std::sregex_iterator it(html.begin(), html.end(), kElement); it != std::sregex_iterator();
       ++it) {
    if (!(*it)[1].matched) {
      ++page;
      continue;
    }
    words.push_back({page, std::stod((*it)[1]), std::stod((*it)[2]), std::stod((*it)[3]),
                     std::stod((*it)[4]), (*it)[5]});
  }
  return words;
}

std::string PrintedPages::squeezedText() const { return squeezed(output("pdftotext -raw % -")); }

std::string PrintedPages::scannedCode(int page) const {
  const std::string number = std::to_string(page);
  return output("pdftoppm -r 200 -gray -f " + number + " -l " + number +
                " % @/scan && zbarimg --raw -q @/scan*.pgm 2>/dev/null; rm -f @/scan*");
}

long PrintedPages::pixelsOf(int red, int green, int blue) const {
  const std::string picture = output("pdftoppm -r 100 -f 1 -l 1 %");
  const std::string wanted{static_cast<char>(red), static_cast<char>(green),
                           static_cast<char>(blue)};
  long count = 0;
  std::size_t at = picture.find("255\n");
  if (at == std::string::npos) throw std::runtime_error("no picture");
  for (at += 4; at + 3 <= picture.size(); at += 3) {
    if (picture.compare(at, 3, wanted) == 0) ++count;
  }
  return count;
}

std::string squeezed(const std::string& text) {
  std::string result = text;
  replaceAll(result, "\u00A0", "");
  std::erase_if(result,
                [](char c) { return c == ' ' || c == '\n' || c == '\f' || c == '\r' || c == '-'; });
  return result;
}

}  // namespace vialkeeper::exports
