package org.hullsum.closure;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** The shells of one volume, each turned outward where it is closed and consistent. */
public final class ShellFinder {
  private ShellFinder() {}

  /** Tells whether a shell surrounds a patch that is not on it. */
  public interface Containment {
    /** Whether a point of the patch lies within the surface that the patches form. */
    boolean contains(List<Integer> shell, int patch);
  }

  /**
   * The shells, in the order of their first patches.
   *
   * @param patches their number
   * @param seams between them
   * @param volumes ⅓ ∬ r · n dS of each patch by its construction normal, all about one point
   * @param containment asked only where there are several closed shells
   */
  public static List<Shell> shells(
      int patches, Seams seams, double[] volumes, Containment containment) {
    SignSystem system = new SignSystem(patches);
    boolean[] broken = new boolean[patches];
    boolean[] twisted = new boolean[patches];
    for (Seam seam : seams.seams()) {
      if (seam.isCrowded()) {
        seam.patches().forEach(p -> broken[p] = true);
      } else if (seam.isSelfSeam()) {
        twisted[seam.sides().get(0).patch()] |= !seam.agrees();
      } else {
        int one = seam.sides().get(0).patch();
        system.relate(one, seam.sides().get(1).patch(), seam.agrees() ? 1 : -1);
      }
    }
    seams.gaps().forEach(gap -> gap.patches().forEach(p -> broken[p] = true));
    Map<Integer, List<Integer>> members = new TreeMap<>();
    for (int p = 0; p < patches; p++) {
      members.computeIfAbsent(system.component(p), k -> new ArrayList<>()).add(p);
    }
    List<Shell> shells = new ArrayList<>();
    for (List<Integer> shell : members.values()) {
      shells.add(
          new Shell(
              shell,
              shell.stream().map(system::sign).toList(),
              system.isConsistent(shell.get(0)) && shell.stream().noneMatch(p -> twisted[p]),
              shell.stream().noneMatch(p -> broken[p]),
              false));
    }
    return outward(shells, volumes, containment);
  }

  private static List<Shell> outward(
      List<Shell> shells, double[] volumes, Containment containment) {
    List<Shell> closed = shells.stream().filter(Shell::closed).toList();
    List<Shell> turned = new ArrayList<>();
    for (Shell shell : shells) {
      if (!shell.oriented()) {
        turned.add(shell);
        continue;
      }
      int around = 0;
      for (Shell other : closed) {
        if (!other.equals(shell) && containment.contains(other.patches(), shell.patches().get(0))) {
          around++;
        }
      }
      boolean cavity = around % 2 == 1;
      double volume = 0;
      for (int k = 0; k < shell.patches().size(); k++) {
        volume += shell.signs().get(k) * volumes[shell.patches().get(k)];
      }
      int turn = (volume < 0) == cavity ? 1 : -1;
      turned.add(
          new Shell(
              shell.patches(),
              shell.signs().stream().map(s -> turn * s).toList(),
              true,
              true,
              cavity));
    }
    return turned;
  }
}
