// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/canonical_json.h"

#include <fmt/format.h>
#include <sodium.h>

#include <algorithm>
#include <charconv>
#include <cmath>
#include <vector>

namespace vialkeeper::db {
namespace {

constexpr std::size_t kLongestHex = 64;

std::string blobText(const Blob& blob) {
  if (blob.bytes.size() <= kLongestHex) return fmt::format(R"({{"hex":"{}"}})", toHex(blob.bytes));
  return fmt::format(R"({{"sha256":"{}","size":{}}})", toHex(sha256(blob.bytes)),
                     blob.bytes.size());
}

std::string cellText(const Cell& cell) {
  if (const auto* whole = std::get_if<std::int64_t>(&cell)) return fmt::format("{}", *whole);
  if (const auto* real = std::get_if<double>(&cell)) return canonicalNumber(*real);
  if (const auto* text = std::get_if<std::string>(&cell)) return canonicalText(*text);
  if (const auto* blob = std::get_if<Blob>(&cell)) return blobText(*blob);
  return "null";
}

int hexDigit(char c) {
  if (c >= '0' && c <= '9') return c - '0';
  return c >= 'a' && c <= 'f' ? c - 'a' + 10 : -1;
}

}  // namespace

std::string canonicalText(std::string_view text) {
  std::string quoted = "\"";
  for (const char c : text) {
    switch (c) {
      case '"':
        quoted += "\\\"";
        break;
      case '\\':
        quoted += "\\\\";
        break;
      case '\b':
        quoted += "\\b";
        break;
      case '\t':
        quoted += "\\t";
        break;
      case '\n':
        quoted += "\\n";
        break;
      case '\f':
        quoted += "\\f";
        break;
      case '\r':
        quoted += "\\r";
        break;
      default:
        if (static_cast<unsigned char>(c) < 0x20) {
          quoted += fmt::format("\\u{:04x}", static_cast<unsigned>(static_cast<unsigned char>(c)));
        } else {
          quoted += c;
        }
    }
  }
  return quoted + '"';
}

std::string canonicalNumber(double number) {
  if (!std::isfinite(number)) return "null";
  if (number == 0.0) return "0";
  // Shortest digits and their decimal exponent, then set out by the rules of ECMA-262,
  // Number::toString.
  std::string shortest = fmt::format("{}", std::abs(number));
  std::string digits;
  for (const char c : shortest.substr(0, shortest.find('e'))) {
    if (c != '.') digits += c;
  }
  digits.erase(0, std::min(digits.find_first_not_of('0'), digits.size() - 1));
  digits.erase(digits.find_last_not_of('0') + 1);
  // The decimal exponent of the first digit.
  int exponent = 0;
  if (const std::size_t e = shortest.find('e'); e != std::string::npos) {
    const char* begin = shortest.data() + e + (shortest[e + 1] == '+' ? 2 : 1);
    std::from_chars(begin, shortest.data() + shortest.size(), exponent);
  } else if (const std::size_t point = shortest.find('.'); shortest.front() != '0') {
    exponent = static_cast<int>(std::min(point, shortest.size())) - 1;
  } else {
    exponent = 1 - static_cast<int>(shortest.find_first_not_of('0', 2));
  }
  const int length = static_cast<int>(digits.size());
  const int n = exponent + 1;
  std::string text;
  if (length <= n && n <= 21) {
    text = digits + std::string(static_cast<std::size_t>(n - length), '0');
  } else if (0 < n && n <= 21) {
    text = digits.substr(0, static_cast<std::size_t>(n)) + "." +
           digits.substr(static_cast<std::size_t>(n));
  } else if (-6 < n && n <= 0) {
    text = "0." + std::string(static_cast<std::size_t>(-n), '0') + digits;
  } else {
    text = digits.substr(0, 1) + (length > 1 ? "." + digits.substr(1) : "") +
           fmt::format("e{}{}", n - 1 < 0 ? '-' : '+', std::abs(n - 1));
  }
  return number < 0.0 ? "-" + text : text;
}

std::string canonicalRow(const Row& row) {
  std::vector<const std::pair<std::string, Cell>*> cells;
  for (const auto& cell : row.cells()) {
    if (!std::holds_alternative<std::monostate>(cell.second)) cells.push_back(&cell);
  }
  std::ranges::sort(cells, {}, [](const auto* cell) { return cell->first; });
  std::string text = "{";
  for (const auto* cell : cells) {
    if (text.size() > 1) text += ',';
    text += canonicalText(cell->first) + ":" + cellText(cell->second);
  }
  return text + "}";
}

std::string toHex(std::string_view bytes) {
  std::string hex;
  hex.reserve(bytes.size() * 2);
  constexpr std::string_view kDigits = "0123456789abcdef";
  for (const char c : bytes) {
    const auto byte = static_cast<unsigned char>(c);
    hex += kDigits[byte >> 4U];
    hex += kDigits[byte & 0xFU];
  }
  return hex;
}

std::string fromHex(std::string_view hex) {
  if (hex.size() % 2 != 0) return {};
  std::string bytes;
  for (std::size_t i = 0; i < hex.size(); i += 2) {
    const int high = hexDigit(hex[i]);
    const int low = hexDigit(hex[i + 1]);
    if (high < 0 || low < 0) return {};
    bytes += static_cast<char>(high * 16 + low);
  }
  return bytes;
}

std::string sha256(std::string_view bytes) {
  std::string digest(crypto_hash_sha256_BYTES, '\0');
  crypto_hash_sha256(reinterpret_cast<unsigned char*>(digest.data()),
                     reinterpret_cast<const unsigned char*>(bytes.data()), bytes.size());
  return digest;
}

}  // namespace vialkeeper::db
