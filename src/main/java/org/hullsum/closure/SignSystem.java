package org.hullsum.closure;

/**
 * Unknown signs, one a patch, and relations between pairs of them: equal or opposite. Components of
 * related unknowns are kept with each one's sign relative to the component's own; a relation that
 * contradicts those before it spoils its component.
 *
 * <p>Union-find with parity, almost linear (R. E. Tarjan, "Efficiency of a good but not linear set
 * union algorithm", J. ACM 22 (1975) 215–225).
 */
final class SignSystem {
  private final int[] parent;
  private final int[] sign;
  private final boolean[] spoilt;

  SignSystem(int unknowns) {
    parent = new int[unknowns];
    sign = new int[unknowns];
    spoilt = new boolean[unknowns];
    for (int i = 0; i < unknowns; i++) {
      parent[i] = i;
      sign[i] = 1;
    }
  }

  /** The unknown that stands for the component. */
  int component(int unknown) {
    int root = unknown;
    int relative = 1;
    while (parent[root] != root) {
      relative *= sign[root];
      root = parent[root];
    }
    int at = unknown;
    while (parent[at] != at) {
      int next = parent[at];
      int rest = relative * sign[at];
      parent[at] = root;
      sign[at] = relative;
      relative = rest;
      at = next;
    }
    return root;
  }

  /** +1 or −1, relative to the component. */
  int sign(int unknown) {
    return component(unknown) == unknown ? 1 : sign[unknown];
  }

  /** Whether no relation in the component contradicts another. */
  boolean isConsistent(int unknown) {
    return !spoilt[component(unknown)];
  }

  /** States that the product of two signs is {@code product}, +1 or −1. */
  void relate(int one, int other, int product) {
    int rootOne = component(one);
    int rootOther = component(other);
    int needed = product * sign(one) * sign(other);
    if (rootOne == rootOther) {
      spoilt[rootOne] |= needed < 0;
      return;
    }
    int kept = Math.min(rootOne, rootOther);
    int joined = Math.max(rootOne, rootOther);
    parent[joined] = kept;
    sign[joined] = needed;
    spoilt[kept] |= spoilt[joined];
  }
}
