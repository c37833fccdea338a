// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QList>
#include <QPointF>
#include <QRectF>
#include <cstddef>
#include <optional>
#include <span>
#include <utility>

/// What of a long curve is drawn: never more than the screen can show, and nothing outside the
/// axes. All of it pure. `x` increases weakly, `y` has as many numbers and may hold NaN.
namespace vialkeeper::ui {

/// Places of the points in view, with one more on either side so that the line runs on to the edge.
[[nodiscard]] std::pair<std::size_t, std::size_t> placesInView(std::span<const double> x,
                                                               double from, double to);

/// The curve in view with at most four points for each of `columns`: first, least, greatest and
/// last of every column, in their order, so that no peak is lost. A NaN stands for a gap and counts
/// as one of the four. Cost is linear in the points in view.
[[nodiscard]] QList<QPointF> decimated(std::span<const double> x, std::span<const double> y,
                                       double from, double to, int columns);

/// Least and greatest of what was decimated, between `from` and `to`; nothing where there is none.
[[nodiscard]] std::optional<std::pair<double, double>> extentOf(const QList<QPointF>& points,
                                                                double from, double to);

/// The line cut at the rectangle; a NaN stands where it leaves and comes back.
[[nodiscard]] QList<QPointF> clippedLine(const QList<QPointF>& points, const QRectF& inside);

/// The points within the rectangle, without gaps.
[[nodiscard]] QList<QPointF> pointsInside(const QList<QPointF>& points, const QRectF& inside);

}  // namespace vialkeeper::ui
