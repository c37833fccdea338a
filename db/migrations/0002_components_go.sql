-- SPDX-FileCopyrightText: The Vialkeeper developers
-- SPDX-License-Identifier: GPL-3.0-or-later
--
-- The plan of a run may change after it was added: a component can be taken out. The program names it in
-- `setting` while it does so and the trail keeps it whole; nothing else deletes one. A sealed run keeps all
-- it has and gets none more.

DROP TRIGGER component_stays;
CREATE TRIGGER component_stays BEFORE DELETE ON component
WHEN (SELECT state FROM run WHERE n = OLD.run_n) = 'sealed'
  OR NOT EXISTS (SELECT 1 FROM setting WHERE name = 'removing component' AND value = CAST(OLD.n AS TEXT))
BEGIN SELECT raise(ABORT, 'a component is never deleted'); END;
CREATE TRIGGER sealed_run_takes_no_component BEFORE INSERT ON component
WHEN (SELECT state FROM run WHERE n = NEW.run_n) = 'sealed'
BEGIN SELECT raise(ABORT, 'a sealed run is never changed'); END;
