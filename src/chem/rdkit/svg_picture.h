// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>
#include <vector>

/// The paths of a structure and the box around them, taken out of RDKit's SVG and put into a
/// plain one of any size. RDKit's own canvas rounds its size to whole pixels and then changes the
/// scale of small molecules by up to a tenth to fit; a scheme needs one scale for all.
namespace vialkeeper::chem {

/// One path: the outline and how it is painted, both as SVG attribute values.
struct SvgPath {
  std::string outline;  ///< of `d`: absolute M, L, Q, C and Z only
  std::string style;    ///< of `style`
};

/// Paths and their bounding box with line widths [units of the paths].
struct SvgPicture {
  std::vector<SvgPath> paths;
  double left = 0.0;
  double top = 0.0;
  double right = 0.0;
  double bottom = 0.0;
};

/// The picture in an SVG that RDKit has drawn in black.
/// Throws std::runtime_error where it holds anything but paths of the kind above.
[[nodiscard]] SvgPicture pictureOf(std::string_view rdkitSvg);

/// The picture in the middle of an SVG of the given size [px]: `scale` px for one of its units,
/// less where it would not fit.
[[nodiscard]] std::string toSvg(const SvgPicture& picture, int width_px, int height_px,
                                double scale);

}  // namespace vialkeeper::chem
