package org.hullsum.closure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Which way the patches of all volumes face, from their seams: one unknown a patch, +1 where its
 * construction normal points out of the volume that it leaves.
 *
 * <p>The seams of each volume relate the unknowns of its patches, a patch between two volumes
 * carries the relation on, and every closed shell says which of the two ways round its patches are.
 * So a patch of an open volume is known where another volume knows it, or its neighbour.
 */
public final class OrientationSystem {
  private final int[] sides;
  private final boolean[] conflicts;

  /**
   * One volume.
   *
   * @param patches the number of each of its patches among all
   * @param leaving +1 for each that leaves the volume, −1 for each that enters it
   * @param shells whose patches are indices into those lists
   */
  public record Part(List<Integer> patches, List<Integer> leaving, List<Shell> shells) {
    public Part {
      patches = List.copyOf(patches);
      leaving = List.copyOf(leaving);
      shells = List.copyOf(shells);
    }

    /** The unknown's value by the shell's sign of its k-th patch. */
    private int value(Shell shell, int k) {
      return shell.signs().get(k) * leaving.get(shell.patches().get(k));
    }

    private int patch(Shell shell, int k) {
      return patches.get(shell.patches().get(k));
    }
  }

  private OrientationSystem(int[] sides, boolean[] conflicts) {
    this.sides = sides;
    this.conflicts = conflicts;
  }

  /**
   * Solves it.
   *
   * @param patches number of all
   */
  public static OrientationSystem solve(int patches, List<Part> parts) {
    SignSystem system = new SignSystem(patches);
    int[] told = new int[patches];
    boolean[] conflicts = new boolean[patches];
    for (Part part : parts) {
      for (Shell shell : part.shells()) {
        for (int k = 0; k < shell.patches().size() && shell.consistent(); k++) {
          system.relate(
              part.patch(shell, 0),
              part.patch(shell, k),
              part.value(shell, 0) * part.value(shell, k));
          if (shell.closed()) {
            int patch = part.patch(shell, k);
            conflicts[patch] |= told[patch] == -part.value(shell, k);
            told[patch] = part.value(shell, k);
          }
        }
      }
    }
    int[] votes = new int[patches];
    boolean[] split = new boolean[patches];
    for (int p = 0; p < patches; p++) {
      if (told[p] != 0) {
        int root = system.component(p);
        int vote = told[p] * system.sign(p);
        split[root] |= conflicts[p] || votes[root] == -vote;
        votes[root] = vote;
      }
    }
    int[] sides = new int[patches];
    for (int p = 0; p < patches; p++) {
      int root = system.component(p);
      boolean whole = system.isConsistent(p) && !split[root];
      sides[p] = conflicts[p] ? 0 : whole ? votes[root] * system.sign(p) : told[p];
    }
    return new OrientationSystem(sides, conflicts);
  }

  /**
   * +1 where the construction normal of a patch points out of the volume that it leaves, −1 where
   * into it, 0 where the seams do not tell.
   */
  public int side(int patch) {
    return sides[patch];
  }

  /** Whether the volumes on the two sides of a patch contradict each other. */
  public boolean isConflict(int patch) {
    return conflicts[patch];
  }

  /**
   * The patches to turn in open shells, where no side is outward: of the two ways to make the
   * normals agree the one that turns fewer.
   *
   * @param declared +1 for each patch declared along its construction normal, −1 against, 0 for one
   *     that faces as it is found and is not turned
   */
  public static List<Integer> fewestToTurn(Part part, List<Integer> declared) {
    List<Integer> turned = new ArrayList<>();
    for (Shell shell : part.shells()) {
      if (!shell.consistent() || shell.closed()) {
        continue;
      }
      List<Integer> with = new ArrayList<>();
      List<Integer> against = new ArrayList<>();
      for (int k = 0; k < shell.patches().size(); k++) {
        int sign = declared.get(shell.patches().get(k));
        if (sign != 0) {
          (part.value(shell, k) == sign ? with : against).add(part.patch(shell, k));
        }
      }
      turned.addAll(with.size() < against.size() ? with : against);
    }
    int[] sorted = turned.stream().mapToInt(p -> p).sorted().toArray();
    return Arrays.stream(sorted).boxed().toList();
  }
}
