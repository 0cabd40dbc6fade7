/** Made at open, so that no migration can lose them: what was written once is never changed. */
export const triggers = `
CREATE TRIGGER IF NOT EXISTS activity_no_update BEFORE UPDATE ON activity
BEGIN SELECT RAISE(ABORT, 'activity is append-only'); END;
CREATE TRIGGER IF NOT EXISTS activity_no_delete BEFORE DELETE ON activity
BEGIN SELECT RAISE(ABORT, 'activity is append-only'); END;
CREATE TRIGGER IF NOT EXISTS comparison_versions_no_update BEFORE UPDATE ON comparison_versions
BEGIN SELECT RAISE(ABORT, 'a version of a comparison is never changed'); END;
CREATE TRIGGER IF NOT EXISTS alignments_no_update BEFORE UPDATE ON alignments
BEGIN SELECT RAISE(ABORT, 'an alignment is never changed'); END;
`
