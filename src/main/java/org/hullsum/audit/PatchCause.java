package org.hullsum.audit;

import java.util.Objects;

/**
 * Something that may be wrong with what is stated of one patch, so that its true rate is a multiple
 * of the stated one.
 *
 * @param kind what would be wrong
 * @param factor by which the stated rate is to be multiplied
 * @param supposition what is supposed, to follow "If"
 * @param check how to find out
 */
record PatchCause(Explanation.Kind kind, double factor, String supposition, String check) {
  PatchCause {
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(supposition, "supposition");
    Objects.requireNonNull(check, "check");
  }
}
