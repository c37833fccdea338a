// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/svg_picture.h"

#include <fmt/format.h>

#include <algorithm>
#include <charconv>
#include <limits>
#include <stdexcept>

namespace vialkeeper::chem {
namespace {

/// The value of an attribute of one element, which RDKit puts in single quotes; empty if absent.
std::string attribute(std::string_view element, std::string_view name) {
  const std::string opening = fmt::format(" {}='", name);
  const std::size_t found = element.find(opening);
  if (found == std::string_view::npos) return {};
  const std::size_t start = found + opening.size();
  const std::size_t end = element.find('\'', start);
  if (end == std::string_view::npos) throw std::runtime_error("unfinished attribute");
  std::string value(element.substr(start, end - start));
  std::replace(value.begin(), value.end(), '\n', ' ');
  return value;
}

/// The line width in a style, 0 where nothing is stroked.
double strokeWidth(std::string_view style) {
  constexpr std::string_view kWidth = "stroke-width:";
  const std::size_t found = style.find(kWidth);
  if (found == std::string_view::npos) return 0.0;
  double width = 0.0;
  const char* first = style.data() + found + kWidth.size();
  std::from_chars(first, style.data() + style.size(), width);
  return width;
}

/// Widens the box by the points of an outline, control points included, and half a line.
void include(SvgPicture& picture, std::string_view outline, double margin) {
  bool isX = true;
  const char* next = outline.data();
  const char* const end = next + outline.size();
  while (next != end) {
    double value = 0.0;
    const auto [after, error] = std::from_chars(next, end, value);
    if (error != std::errc()) {
      if (std::string_view(" ,\nMLQCZz").find(*next) == std::string_view::npos) {
        throw std::runtime_error("unknown outline");
      }
      ++next;
      continue;
    }
    next = after;
    double& low = isX ? picture.left : picture.top;
    double& high = isX ? picture.right : picture.bottom;
    low = std::min(low, value - margin);
    high = std::max(high, value + margin);
    isX = !isX;
  }
  if (!isX) throw std::runtime_error("odd number of coordinates");
}

}  // namespace

SvgPicture pictureOf(std::string_view rdkitSvg) {
  constexpr double kFar = std::numeric_limits<double>::max();
  SvgPicture picture{{}, kFar, kFar, -kFar, -kFar};
  std::size_t start = rdkitSvg.find("<svg");
  while ((start = rdkitSvg.find('<', start + 1)) != std::string_view::npos) {
    const std::size_t end = std::min(rdkitSvg.find('>', start), rdkitSvg.size());
    const std::string_view element = rdkitSvg.substr(start, end - start);
    if (element.starts_with("</") || element.starts_with("<!--")) continue;
    if (!element.starts_with("<path ")) throw std::runtime_error("an element that is no path");
    SvgPath path{attribute(element, "d"), attribute(element, "style")};
    if (path.style.empty()) path.style = "fill:" + attribute(element, "fill");
    include(picture, path.outline, strokeWidth(path.style) / 2.0);
    picture.paths.push_back(std::move(path));
  }
  if (picture.paths.empty()) throw std::runtime_error("nothing drawn");
  return picture;
}

std::string toSvg(const SvgPicture& picture, int width_px, int height_px, double scale) {
  const double width = picture.right - picture.left;
  const double height = picture.bottom - picture.top;
  const double fitted = std::min({scale, width_px / width, height_px / height});
  const double x = (width_px - fitted * width) / 2.0 - fitted * picture.left;
  const double y = (height_px - fitted * height) / 2.0 - fitted * picture.top;
  std::string svg = fmt::format(
      "<svg xmlns='http://www.w3.org/2000/svg' width='{0}' height='{1}' viewBox='0 0 {0} {1}'>\n"
      "<g transform='translate({2:.3f} {3:.3f}) scale({4:.6f})'>\n",
      width_px, height_px, x, y, fitted);
  for (const SvgPath& path : picture.paths) {
    svg += fmt::format("<path d='{}' style='{}'/>\n", path.outline, path.style);
  }
  return svg + "</g>\n</svg>\n";
}

}  // namespace vialkeeper::chem
