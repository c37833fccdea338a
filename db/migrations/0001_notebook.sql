-- SPDX-FileCopyrightText: The Vialkeeper developers
-- SPDX-License-Identifier: GPL-3.0-or-later
--
-- The notebook, first form. Released: never edited again, only followed by the next migration.
--
-- Every table of records has `n`, the row's number in this file, by which tables refer to each other,
-- `id`, a UUIDv7 by which the world may, and `version`, which counts its changes, so that a writer who read
-- an older version is told. All that is written to these tables is told in `revision`, in the same
-- transaction. Quantities are in the unit that ends the column's name; times are UTC in milliseconds beside
-- the local offset in minutes. Texts that a person typed are kept as typed.

CREATE TABLE setting (
  name  TEXT PRIMARY KEY,
  value TEXT NOT NULL
) STRICT;

CREATE TABLE person (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  code TEXT NOT NULL UNIQUE,          -- initials: KW
  name TEXT
) STRICT;

CREATE TABLE substance (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  name TEXT NOT NULL,
  formula TEXT, smiles TEXT, canonical_smiles TEXT, inchi_key TEXT, cas TEXT,
  molar_mass_g_mol REAL, u_molar_mass_g_mol REAL,
  fingerprint BLOB,                   -- RDKit pattern fingerprint, for the substructure prefilter
  hazards TEXT,                       -- codes, separated by blanks
  note TEXT
) STRICT;
CREATE INDEX substance_cas ON substance(cas) WHERE cas IS NOT NULL;
CREATE INDEX substance_structure ON substance(canonical_smiles) WHERE canonical_smiles IS NOT NULL;

CREATE TABLE substance_name (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  substance_n INTEGER NOT NULL REFERENCES substance(n),
  name TEXT NOT NULL,
  folded TEXT NOT NULL                -- for comparison: case, accents and blanks ignored
) STRICT;
CREATE INDEX substance_name_folded ON substance_name(folded);
CREATE INDEX substance_name_of ON substance_name(substance_n);

CREATE TABLE lot (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  name TEXT NOT NULL UNIQUE,
  substance_n INTEGER NOT NULL REFERENCES substance(n),
  assay REAL, u_assay REAL, density_g_ml REAL, opened TEXT, note TEXT
) STRICT;
CREATE INDEX lot_of ON lot(substance_n);

CREATE TABLE stock (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  name TEXT NOT NULL UNIQUE,
  substance_n INTEGER NOT NULL REFERENCES substance(n),
  solvent TEXT, concentration_mol_l REAL, u_concentration_mol_l REAL, volume_ml REAL, made TEXT, note TEXT
) STRICT;
CREATE INDEX stock_of ON stock(substance_n);

CREATE TABLE vial_type (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  name TEXT NOT NULL UNIQUE,
  volume_ml REAL NOT NULL, u_volume_ml REAL, displaced_ml REAL, rated_gauge_bar REAL, derating REAL, note TEXT
) STRICT;

CREATE TABLE lamp (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  name TEXT NOT NULL UNIQUE,
  wavelength_nm REAL, power_w REAL, note TEXT
) STRICT;

CREATE TABLE balance (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  name TEXT NOT NULL UNIQUE,
  readability_mg REAL NOT NULL, repeatability_mg REAL NOT NULL, note TEXT
) STRICT;

CREATE TABLE pipette (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  name TEXT NOT NULL UNIQUE,
  nominal_ul REAL NOT NULL, smallest_ul REAL, systematic_ul REAL NOT NULL, random_ul REAL NOT NULL, note TEXT
) STRICT;

-- Files as they came, byte for byte, each once.
CREATE TABLE attachment (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  sha256 BLOB NOT NULL UNIQUE,
  size INTEGER NOT NULL,
  data BLOB NOT NULL
) STRICT;

CREATE TABLE run (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  code TEXT NOT NULL UNIQUE,          -- KW-0042
  person_n INTEGER NOT NULL REFERENCES person(n),
  state TEXT NOT NULL CHECK (state IN ('planned', 'charged', 'irradiating', 'worked-up', 'closed', 'sealed')),
  title TEXT, series TEXT, aim TEXT, conclusion TEXT,
  created_ms INTEGER NOT NULL, created_offset_min INTEGER NOT NULL,
  plan_n INTEGER NOT NULL REFERENCES attachment(n),   -- the plan's text
  cloned_from_n INTEGER REFERENCES run(n),
  vial TEXT, lamp TEXT, atmosphere TEXT,
  wavelength_nm REAL, temperature_c REAL, duration_h REAL,
  limiting_key TEXT NOT NULL, limiting_mmol REAL NOT NULL, liquid_ml REAL NOT NULL,
  yield_percent REAL, u_yield_percent REAL, conversion_percent REAL, u_conversion_percent REAL
) STRICT;
CREATE INDEX run_created ON run(created_ms);
CREATE INDEX run_series ON run(series) WHERE series IS NOT NULL;

CREATE TABLE component (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  run_n INTEGER NOT NULL REFERENCES run(n),
  position INTEGER NOT NULL,
  key TEXT NOT NULL, role TEXT NOT NULL, name TEXT NOT NULL,
  substance_n INTEGER NOT NULL REFERENCES substance(n),
  lot_n INTEGER REFERENCES lot(n), stock_n INTEGER REFERENCES stock(n),
  planned_mmol REAL, planned_mol_percent REAL, planned_mol_l REAL, target_mg REAL, target_ul REAL,
  actual_text TEXT, actual_mg REAL, actual_ul REAL,
  weighed_ms INTEGER, weighed_offset_min INTEGER, weighed_by_n INTEGER REFERENCES person(n),
  charged_mmol REAL, u_charged_mmol REAL, charged_mol_percent REAL, charged_mol_l REAL,
  loading_mol_percent REAL,           -- as charged where it was weighed, else as planned: what `find` compares
  UNIQUE (run_n, key)
) STRICT;
-- Newest first within a substance and role, the loading at hand without the row: the one index that
-- searching needs.
CREATE INDEX component_find ON component(role, substance_n, run_n DESC, loading_mol_percent);
CREATE INDEX component_substance ON component(substance_n, run_n DESC, loading_mol_percent);

CREATE TABLE event (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  run_n INTEGER NOT NULL REFERENCES run(n),
  kind TEXT NOT NULL,
  raw TEXT NOT NULL,                  -- as typed
  at_ms INTEGER NOT NULL, at_offset_min INTEGER NOT NULL,      -- when it happened
  logged_ms INTEGER NOT NULL, logged_offset_min INTEGER NOT NULL,  -- when it was written down
  person_n INTEGER NOT NULL REFERENCES person(n),
  supersedes_n INTEGER UNIQUE REFERENCES event(n),
  pressure_bar REAL, pressure_kind TEXT CHECK (pressure_kind IN ('gauge', 'abs')),
  temperature_c REAL, volume_ul REAL, gas TEXT, amount_mmol REAL, fraction REAL,
  note TEXT, attachment_n INTEGER REFERENCES attachment(n), attachment_name TEXT
) STRICT;
CREATE INDEX event_of_run ON event(run_n, at_ms);

CREATE TABLE dataset (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  code TEXT NOT NULL UNIQUE,          -- DS-0007
  kind TEXT NOT NULL CHECK (kind IN ('course', 'quench', 'decay', 'pressure', 'headspace')),
  title TEXT,
  columns TEXT NOT NULL,              -- JSON: [{"name", "unit"}], in the file's order
  row_count INTEGER NOT NULL,
  raw_n INTEGER NOT NULL REFERENCES attachment(n), raw_name TEXT NOT NULL,
  recipe TEXT                         -- JSON: how the raw file was read
) STRICT;

-- One column's values as little-endian doubles, in blocks; a cell without a number is a quiet NaN.
CREATE TABLE dataset_block (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  dataset_n INTEGER NOT NULL REFERENCES dataset(n),
  column_index INTEGER NOT NULL, block_index INTEGER NOT NULL, count INTEGER NOT NULL,
  data BLOB NOT NULL,
  UNIQUE (dataset_n, column_index, block_index)
) STRICT;

CREATE TABLE run_dataset (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  run_n INTEGER NOT NULL REFERENCES run(n),
  dataset_n INTEGER NOT NULL REFERENCES dataset(n),
  UNIQUE (run_n, dataset_n)
) STRICT;
CREATE INDEX run_dataset_of ON run_dataset(dataset_n);

CREATE TABLE analysis (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  run_n INTEGER REFERENCES run(n),
  kind TEXT NOT NULL, inputs_sha256 BLOB NOT NULL, settings TEXT NOT NULL, program_version TEXT NOT NULL,
  result TEXT NOT NULL, made_ms INTEGER NOT NULL
) STRICT;
CREATE INDEX analysis_of_run ON analysis(run_n);

-- A signing key of a person: the secret half is sealed under a passphrase (Argon2id).
CREATE TABLE signing_key (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  person_n INTEGER NOT NULL REFERENCES person(n),
  public_key BLOB NOT NULL UNIQUE,
  sealed_secret BLOB NOT NULL, salt BLOB NOT NULL, nonce BLOB NOT NULL,
  operations INTEGER NOT NULL, memory_bytes INTEGER NOT NULL
) STRICT;

CREATE TABLE seal (
  n INTEGER PRIMARY KEY, id BLOB NOT NULL UNIQUE, version INTEGER NOT NULL DEFAULT 1,
  run_n INTEGER NOT NULL REFERENCES run(n),
  meaning TEXT NOT NULL CHECK (meaning IN ('author', 'witness')),
  signing_key_n INTEGER NOT NULL REFERENCES signing_key(n),
  canonical TEXT NOT NULL,            -- canonical JSON of the run and all it links to
  sha256 BLOB NOT NULL, signature BLOB NOT NULL,
  signed_ms INTEGER NOT NULL, signed_offset_min INTEGER NOT NULL
) STRICT;
CREATE INDEX seal_of_run ON seal(run_n);

-- One row for each action of a user, chained: hash covers the row and the hash before it.
CREATE TABLE revision (
  seq INTEGER PRIMARY KEY,
  at_ms INTEGER NOT NULL, at_offset_min INTEGER NOT NULL,
  person TEXT NOT NULL,
  action TEXT NOT NULL,               -- 'log', 'weigh', …
  run_n INTEGER,                      -- the run it belongs to, if one
  reason TEXT,
  changes TEXT NOT NULL,              -- canonical JSON: [{"table", "n", "before", "after"}]
  previous BLOB NOT NULL,
  hash BLOB NOT NULL
) STRICT;
CREATE INDEX revision_of_run ON revision(run_n) WHERE run_n IS NOT NULL;

CREATE TRIGGER revision_is_kept BEFORE UPDATE ON revision
BEGIN SELECT raise(ABORT, 'a revision is never changed'); END;
CREATE TRIGGER revision_stays BEFORE DELETE ON revision
BEGIN SELECT raise(ABORT, 'a revision is never deleted'); END;
CREATE TRIGGER revision_follows BEFORE INSERT ON revision
WHEN NEW.seq <> (SELECT coalesce(max(seq), 0) + 1 FROM revision)
  OR NEW.previous <> coalesce((SELECT hash FROM revision ORDER BY seq DESC LIMIT 1), zeroblob(32))
BEGIN SELECT raise(ABORT, 'a revision follows the last one'); END;

CREATE TRIGGER event_is_kept BEFORE UPDATE ON event
BEGIN SELECT raise(ABORT, 'an event is never changed, only superseded'); END;
CREATE TRIGGER event_stays BEFORE DELETE ON event
BEGIN SELECT raise(ABORT, 'an event is never deleted'); END;
CREATE TRIGGER attachment_is_kept BEFORE UPDATE ON attachment
BEGIN SELECT raise(ABORT, 'a raw file is never changed'); END;
CREATE TRIGGER attachment_stays BEFORE DELETE ON attachment
BEGIN SELECT raise(ABORT, 'a raw file is never deleted'); END;
CREATE TRIGGER seal_is_kept BEFORE UPDATE ON seal
BEGIN SELECT raise(ABORT, 'a seal is never changed'); END;
CREATE TRIGGER seal_stays BEFORE DELETE ON seal
BEGIN SELECT raise(ABORT, 'a seal is never deleted'); END;
CREATE TRIGGER sealed_run_is_kept BEFORE UPDATE ON run WHEN OLD.state = 'sealed'
BEGIN SELECT raise(ABORT, 'a sealed run is never changed'); END;
CREATE TRIGGER run_stays BEFORE DELETE ON run
BEGIN SELECT raise(ABORT, 'a run is never deleted'); END;
CREATE TRIGGER sealed_component_is_kept BEFORE UPDATE ON component
WHEN (SELECT state FROM run WHERE n = OLD.run_n) = 'sealed'
BEGIN SELECT raise(ABORT, 'a sealed run is never changed'); END;
CREATE TRIGGER component_stays BEFORE DELETE ON component
BEGIN SELECT raise(ABORT, 'a component is never deleted'); END;
CREATE TRIGGER sealed_run_takes_addenda BEFORE INSERT ON event
WHEN NEW.kind <> 'addendum' AND (SELECT state FROM run WHERE n = NEW.run_n) = 'sealed'
BEGIN SELECT raise(ABORT, 'a sealed run takes addenda only'); END;

-- The words of a run, for searching: derived, and written in the same transaction as what they are from.
-- The index follows by statements of the program's own, not by triggers: with trusted_schema off SQLite lets
-- no trigger write to a virtual table.
CREATE TABLE run_words (
  run_n INTEGER PRIMARY KEY REFERENCES run(n),
  code TEXT NOT NULL, title TEXT NOT NULL, aim TEXT NOT NULL, conclusion TEXT NOT NULL,
  observations TEXT NOT NULL
) STRICT;
CREATE VIRTUAL TABLE run_search USING fts5(
  code, title, aim, conclusion, observations,
  content = 'run_words', content_rowid = 'run_n', tokenize = "unicode61 remove_diacritics 2");
