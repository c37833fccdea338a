// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <map>
#include <optional>
#include <string>
#include <string_view>
#include <variant>
#include <vector>

#include "units/iso_time.h"

/// What a notebook keeps, as plain values. Names and units are those of the file's columns.
namespace vialkeeper::app {

/// A record's number in its table of this notebook; 0 for one that is not written yet.
using RowNumber = std::int64_t;

/// Who acts and when.
struct Author {
  std::string person = {};  ///< initials
  units::Moment at;
};

struct Person {
  RowNumber n = 0;
  std::int64_t version = 0;
  std::string code = {};  ///< initials: `KW`
  std::string name = {};
};

struct SubstanceRecord {
  RowNumber n = 0;
  std::int64_t version = 0;
  std::string name = {};
  std::vector<std::string> synonyms = {};  ///< besides the name
  std::string formula = {};
  std::string smiles = {};  ///< as given
  std::string canonicalSmiles = {};
  std::string inchiKey = {};
  std::string cas = {};
  std::optional<double> molarMass_g_mol = {};
  std::optional<double> uMolarMass_g_mol = {};
  std::string fingerprint = {};  ///< bytes, for the substructure prefilter; empty without structure
  std::vector<std::string> hazards = {};  ///< codes
  std::string note = {};
};

/// The kinds of the shelf besides substances.
enum class ShelfKind { kLot, kStock, kVial, kLamp, kBalance, kPipette };

using FieldValue = std::variant<std::string, double>;

/// A card of the shelf: its kind says which fields it may have (shelf_fields.h).
struct ShelfCard {
  ShelfKind kind = ShelfKind::kVial;
  RowNumber n = 0;
  std::int64_t version = 0;
  std::string name = {};
  RowNumber substance = 0;  ///< lots and stocks only
  std::map<std::string, FieldValue> fields = {};
};

/// The life of a run, in order.
enum class RunState { kPlanned, kCharged, kIrradiating, kWorkedUp, kClosed, kSealed };

[[nodiscard]] std::string_view toText(RunState state);
[[nodiscard]] std::optional<RunState> runStateFromText(std::string_view text);

struct RunRecord {
  RowNumber n = 0;
  std::int64_t version = 0;
  std::string code = {};  ///< `KW-0042`
  std::string person = {};
  RunState state = RunState::kPlanned;
  std::string title = {};
  std::string series = {};
  std::string aim = {};
  std::string conclusion = {};
  units::Moment created{};
  RowNumber plan = 0;  ///< attachment that holds the plan's text
  RowNumber clonedFrom = 0;
  std::string vial = {};
  std::string lamp = {};
  std::string atmosphere = {};
  std::optional<double> wavelength_nm = {};
  std::optional<double> temperature_C = {};
  std::optional<double> duration_h = {};
  std::string limitingKey = {};
  double limiting_mmol = 0.0;
  double liquid_mL = 0.0;
  std::optional<double> yield_percent = {};
  std::optional<double> uYield_percent = {};
  std::optional<double> conversion_percent = {};
  std::optional<double> uConversion_percent = {};
};

struct ComponentRecord {
  RowNumber n = 0;
  std::int64_t version = 0;
  RowNumber run = 0;
  int position = 0;
  std::string key = {};
  std::string role = {};
  std::string name = {};
  RowNumber substance = 0;
  RowNumber lot = 0;
  RowNumber stock = 0;
  std::optional<double> planned_mmol = {};
  std::optional<double> planned_molPercent = {};
  std::optional<double> planned_mol_L = {};
  std::optional<double> target_mg = {};
  std::optional<double> target_uL = {};
  std::string actualText = {};  ///< as typed; empty where nothing is recorded
  std::optional<double> actual_mg = {};
  std::optional<double> actual_uL = {};
  std::optional<units::Moment> weighed = {};
  std::string weighedBy = {};
  std::optional<double> charged_mmol = {};
  std::optional<double> uCharged_mmol = {};
  std::optional<double> charged_molPercent = {};
  std::optional<double> charged_mol_L = {};

  /// As charged where it was weighed, else as planned [mol%].
  [[nodiscard]] std::optional<double> loading_molPercent() const {
    return charged_molPercent ? charged_molPercent : planned_molPercent;
  }
};

struct EventRecord {
  RowNumber n = 0;
  RowNumber run = 0;
  std::string kind = {};   ///< `lamp on`, `pressure`, `observation`, …
  std::string raw = {};    ///< as typed
  units::Moment at{};      ///< when it happened
  units::Moment logged{};  ///< when it was written down
  std::string person = {};
  RowNumber supersedes = 0;
  RowNumber supersededBy = 0;  ///< known from the other event; not stored with this one
  std::optional<double> pressure_bar = {};
  std::string pressureKind = {};  ///< `gauge` or `abs`
  std::optional<double> temperature_C = {};
  std::optional<double> volume_uL = {};
  std::string gas = {};
  std::optional<double> amount_mmol = {};
  std::optional<double> fraction = {};
  std::string note = {};
  RowNumber attachment = 0;
  std::string attachmentName = {};
};

/// A column of a dataset.
struct DatasetColumn {
  std::string name = {};
  std::string unit = {};
};

struct DatasetRecord {
  RowNumber n = 0;
  std::string code = {};  ///< `DS-0007`
  std::string kind = {};  ///< `course`, `quench`, `decay`, `pressure`, `headspace`
  std::string title = {};
  std::vector<DatasetColumn> columns = {};
  std::int64_t rows = 0;
  RowNumber raw = 0;  ///< attachment that holds the file as it came
  std::string rawName = {};
  std::string recipe = {};
};

struct SigningKey {
  RowNumber n = 0;
  std::string person = {};
  std::string publicKey = {};     ///< 32 bytes
  std::string sealedSecret = {};  ///< bytes
  std::string salt = {};
  std::string nonce = {};
  std::int64_t operations = 0;
  std::int64_t memory_bytes = 0;
};

struct SealRecord {
  RowNumber n = 0;
  RowNumber run = 0;
  std::string meaning = {};  ///< `author` or `witness`
  RowNumber key = 0;
  std::string person = {};
  std::string publicKey = {};
  std::string canonical = {};
  std::string sha256 = {};
  std::string signature = {};
  units::Moment signedAt{};
};

/// One action of a user, as the trail keeps it.
struct RevisionRecord {
  std::int64_t seq = 0;
  units::Moment at{};
  std::string person = {};
  std::string action = {};
  RowNumber run = 0;
  std::string reason = {};
  std::string changes = {};  ///< canonical JSON
};

}  // namespace vialkeeper::app
