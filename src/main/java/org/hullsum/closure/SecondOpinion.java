package org.hullsum.closure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.hullsum.closure.FoundFacing.Side;
import org.hullsum.closure.WindingOpinion.Numbers;
import org.hullsum.closure.WindingOpinion.Vote;
import org.hullsum.closure.WindingProbes.Probe;

/**
 * An opinion on the facings of one volume's patches by generalized winding numbers alone, which
 * neither rims nor lines have a part in.
 *
 * <p>With every patch facing outward the winding number is 1 within the volume and 0 outside,
 * cavities included. Points beside each patch are known to be on its inner or outer side once its
 * facing is, so what a facing claims can be held against the numbers; and the facings with which
 * all numbers are nearest to what they should be are the opinion. A small gap changes the numbers
 * little, so that an open surface has such facings too, if less clearly: a patch has a side only
 * where the numbers that it has a part in fit well with it and clearly worse, at best, without.
 *
 * <p>(A. Jacobson, L. Kavan, O. Sorkine-Hornung, "Robust inside-outside segmentation using
 * generalized winding numbers", ACM Trans. Graph. 32 (2013) 33, for the numbers; the search for
 * facings is ours.)
 */
public final class SecondOpinion {
  /** Share of a patch at a point from which the point says something of it. */
  private static final double HEARD = 0.1;

  /** Largest misfit that is a fit: half way to where either whole number is as near. */
  private static final double FITS = 0.25;

  /** How much worse the other facing must fit. */
  private static final double CLEARLY = 0.2;

  private final int patches;
  private final List<Probe> probes;

  private SecondOpinion(int patches, List<Probe> probes) {
    this.patches = patches;
    this.probes = probes;
  }

  /** Looks at the winding numbers of the patches of a volume at points beside them. */
  public static SecondOpinion on(List<PatchWinding> patches) {
    return new SecondOpinion(patches.size(), WindingProbes.around(patches));
  }

  /**
   * The opinion where nothing is known of how the patches hang together.
   *
   * @param found as in {@link #of(List, int[])}
   */
  public WindingOpinion of(int[] found) {
    List<Shell> apart = new ArrayList<>();
    for (int k = 0; k < patches; k++) {
      apart.add(new Shell(List.of(k), List.of(1), true, false, false));
    }
    return of(apart, found);
  }

  /**
   * The opinion.
   *
   * @param shells groups of patches whose facings relative to one another are known, each patch in
   *     one of them; where a group is not consistent its patches count one by one
   * @param found +1 for each patch whose construction normal was found to point out of the volume,
   *     −1 into it, 0 where that is not known
   */
  public WindingOpinion of(List<Shell> shells, int[] found) {
    if (probes.isEmpty()) {
      return WindingOpinion.none(patches);
    }
    List<Vote> votes = votes(groups(shells));
    boolean complete = Arrays.stream(found).noneMatch(s -> s == 0);
    return new WindingOpinion(complete ? Optional.of(numbers(found)) : Optional.empty(), votes);
  }

  private List<Numbers> numbers(int[] signs) {
    double[][] worst = new double[patches][2];
    boolean[][] looked = new boolean[patches][2];
    double[] error = new double[patches];
    for (Probe probe : probes) {
      double residual = probe.residual(signs);
      int side = probe.isInside(signs) ? 1 : 0;
      looked[probe.patch()][side] = true;
      double[] known = worst[probe.patch()];
      known[side] = Math.abs(residual) > Math.abs(known[side]) ? residual : known[side];
      error[probe.patch()] = Math.max(error[probe.patch()], probe.error());
    }
    List<Numbers> numbers = new ArrayList<>();
    for (int k = 0; k < patches; k++) {
      if (looked[k][0] && looked[k][1]) {
        numbers.add(new Numbers(k, 1 + worst[k][1], worst[k][0], error[k]));
      }
    }
    return numbers;
  }

  /** For each group the sign with which each patch counts in it, 0 where it is not in it. */
  private int[][] groups(List<Shell> shells) {
    List<int[]> groups = new ArrayList<>();
    for (Shell shell : shells) {
      int[] group = new int[patches];
      for (int k = 0; k < shell.patches().size(); k++) {
        int patch = shell.patches().get(k);
        group[patch] = shell.signs().get(k);
        if (!shell.consistent()) {
          int[] alone = new int[patches];
          alone[patch] = 1;
          groups.add(alone);
        }
      }
      if (shell.consistent()) {
        groups.add(group);
      }
    }
    return groups.toArray(new int[0][]);
  }

  private List<Vote> votes(int[][] groups) {
    double[][] form = new double[probes.size()][groups.length];
    double[] values = new double[probes.size()];
    for (int row = 0; row < form.length; row++) {
      Probe probe = probes.get(row);
      // Within is 1 and outside 0: ½ − ½ · side · sign, whose second part goes to the left.
      values[row] = 0.5;
      for (int g = 0; g < groups.length; g++) {
        form[row][g] = 0.5 * probe.side() * groups[g][probe.patch()];
        for (int j = 0; j < patches; j++) {
          form[row][g] += groups[g][j] * probe.number(j);
        }
      }
    }
    SignSearch search = SignSearch.of(form, values);
    int[] best = search.best();
    Vote[] votes = new Vote[patches];
    for (int g = 0; g < groups.length; g++) {
      double misfit = misfit(form, best, g);
      double otherwise = misfit(form, search.otherwise(g), g);
      boolean clear = misfit <= FITS && otherwise >= misfit + CLEARLY;
      for (int j = 0; j < patches; j++) {
        if (groups[g][j] != 0) {
          Side side = groups[g][j] * best[g] > 0 ? Side.OUT : Side.IN;
          votes[j] = new Vote(clear ? side : Side.UNDETERMINED, misfit, otherwise);
        }
      }
    }
    return List.of(votes);
  }

  /** Over the points that a group has a part in; not a number where there is none. */
  private static double misfit(double[][] form, int[] signs, int group) {
    double sum = 0;
    int heard = 0;
    for (double[] row : form) {
      if (Math.abs(row[group]) >= HEARD) {
        double residual = -0.5;
        for (int g = 0; g < signs.length; g++) {
          residual += row[g] * signs[g];
        }
        sum += residual * residual;
        heard++;
      }
    }
    return Math.sqrt(sum / heard);
  }
}
