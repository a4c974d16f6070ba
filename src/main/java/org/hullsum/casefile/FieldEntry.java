package org.hullsum.casefile;

import java.util.Optional;
import org.hullsum.field.VectorField;
import org.hullsum.units.Dimension;

/**
 * A field that was read.
 *
 * @param field in working units
 * @param dimension of its magnitude; empty with {@code units: none} or where it is bare
 */
record FieldEntry(VectorField field, Optional<Dimension> dimension) {}
