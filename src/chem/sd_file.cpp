// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/sd_file.h"

#include <fmt/format.h>

#include "text/encoding.h"
#include "text/utf8.h"

namespace vialkeeper::chem {
namespace {

std::string plainName(std::string_view name) {
  std::string plain;
  for (const char c : text::asciiLowered(name)) {
    if (c != ' ' && c != '_' && c != '-' && c != '.') plain += c;
  }
  return plain;
}

/// `>  <CAS NUMBER> (4)` gives `CAS NUMBER`.
std::string itemName(std::string_view head) {
  const std::size_t begin = head.find('<');
  const std::size_t end = head.rfind('>');
  if (begin == std::string_view::npos || end == std::string_view::npos || end <= begin) return {};
  return std::string(head.substr(begin + 1, end - begin - 1));
}

class SdReader {
 public:
  SdReader(std::string_view bytes, const std::string& file) : m_rest(bytes), m_file(file) {}

  text::Checked<std::vector<SdRecord>> read() {
    while (!m_rest.empty()) readRecord();
    if (m_records.empty() && m_faults.empty()) {
      m_faults.push_back({.file = m_file,
                          .what = "the file holds no record",
                          .mend = "export it again as an SD file"});
    }
    if (!m_faults.empty()) return std::unexpected(std::move(m_faults));
    return std::move(m_records);
  }

 private:
  std::string_view nextLine() {
    const std::size_t end = m_rest.find('\n');
    std::string_view line = m_rest.substr(0, end);
    m_rest.remove_prefix(end == std::string_view::npos ? m_rest.size() : end + 1);
    if (line.ends_with('\r')) line.remove_suffix(1);
    ++m_line;
    return line;
  }

  void readRecord() {
    SdRecord record{.number = m_number + 1, .line = m_line + 1, .molfile = {}, .title = {}};
    bool isEnded = false;
    bool isBlank = true;
    std::string* value = nullptr;
    while (!m_rest.empty()) {
      const std::string_view line = nextLine();
      if (line.starts_with("$$$$")) break;
      isBlank = isBlank && text::trimmed(line).empty();
      if (!isEnded) {
        if (record.molfile.empty()) record.title = text::trimmed(line);
        record.molfile.append(line).append("\n");
        isEnded = line.starts_with("M  END");
      } else if (line.starts_with('>')) {
        value = &record.items.emplace_back(itemName(line), "").second;
      } else if (value != nullptr) {
        if (text::trimmed(line).empty())
          value = nullptr;
        else
          value->append(value->empty() ? "" : "\n").append(line);
      }
    }
    if (isBlank) return;  // behind the last record
    ++m_number;
    if (isEnded) {
      m_records.push_back(std::move(record));
      return;
    }
    m_faults.push_back({.file = m_file,
                        .line = record.line,
                        .field = fmt::format("record {}", record.number),
                        .what = "the record has no line M  END, so its structure is cut short",
                        .mend = "export the file again"});
  }

  std::string_view m_rest;
  const std::string& m_file;
  int m_line = 0;
  int m_number = 0;
  std::vector<SdRecord> m_records;
  text::Faults m_faults;
};

}  // namespace

std::string_view SdRecord::item(std::string_view name) const {
  for (const auto& [itemName, value] : items) {
    if (plainName(itemName) == plainName(name)) return value;
  }
  return {};
}

text::Checked<std::vector<SdRecord>> readSdFile(std::string_view bytes, const std::string& file) {
  if (auto faults = text::encodingFaults(bytes, file); !faults.empty())
    return std::unexpected(std::move(faults));
  return SdReader(text::withoutByteOrderMark(bytes), file).read();
}

}  // namespace vialkeeper::chem
