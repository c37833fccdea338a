// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>
#include <optional>
#include <vector>

#include "app/notebook/vial_strip.h"

/// The strip of the open run as its widgets show it: words, and shares between 0 and 1. Pure.
namespace vialkeeper::ui {

/// The vial as shares of its volume.
struct VialView {
  double filled = 0.0;  ///< up to the liquid's surface, what it displaces among it
  bool hasStirBar = false;
  QString words = {};  ///< `2.00 mL in 11.6 mL: 9.5 mL headspace`
};

struct GaugeView {
  std::optional<double> reading = {};  ///< share of the gauge's height
  std::optional<double> limit = {};
  bool overLimit = false;
  QString value = {};       ///< `0.38 bar`
  QString detail = {};      ///< `gauge, 35 °C, 14:20`
  QString limitWords = {};  ///< `limit 1.00 bar`
  QString forecast = {};    ///< `no forecast yet`
};

struct LampView {
  QString clock = {};   ///< `Lamp on 11 h 36 min of 20 h`
  QString detail = {};  ///< `440 nm · 2 interruptions`
  bool isOn = false;
};

struct TimelineView {
  struct Interval {
    double from = 0.0;
    double to = 0.0;
    bool open = false;
  };
  struct Mark {
    int entry = 0;
    double at = 0.0;
    QString letter = {};
    QString sentence = {};  ///< `14:20 pressure 0.38 bar gauge at 35 °C`
    bool removesGas = false;
  };
  struct Tick {
    double at = 0.0;
    QString word = {};
  };
  std::vector<Interval> lamp = {};
  std::optional<Interval> planned = {};  ///< what is still to come
  std::vector<Mark> marks = {};
  std::vector<Tick> ticks = {};

  [[nodiscard]] bool isEmpty() const { return lamp.empty() && marks.empty() && !planned; }
};

struct StripView {
  std::optional<VialView> vial = {};
  GaugeView gauge = {};
  LampView lamp = {};
  TimelineView timeline = {};
  std::vector<QString> latest = {};  ///< the last entries that count, newest first
};

[[nodiscard]] StripView stripView(const app::VialStrip& strip);

}  // namespace vialkeeper::ui
