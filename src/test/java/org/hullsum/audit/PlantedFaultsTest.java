package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import org.hullsum.audit.Explanation.Kind;
import org.junit.jupiter.api.Test;

/**
 * Random metered tanks with one fault planted, told from the planted truth alone: what residual
 * each supposition predicts, and so whether the data can tell the planted cause from all others.
 */
class PlantedFaultsTest {
  private static final int TANKS = 2600;
  private static final long SEED = 0x7A4B_0F1A_57EDL;
  private static final double PART = 0.95;

  /** So many standard uncertainties apart, two causes can be told from one another. */
  private static final double APART = 4;

  private static final double DENSITY = 1150;

  /** What m3/h is taken for: how many m3/h each of them is. */
  private static final double[] UNITS = {
    0.06, 3.6, 0.001, 60, 3600, 1 / 24.0, 0.2271247, 0.2727654, 1.699011
  };

  /** What kg/h is taken for: how many kg/h each of them is. */
  private static final double[] MASS_UNITS = {0.45359237, 60, 3600, 1000 / 24.0, 3.6};

  /** Norm cubic metres and actual ones of 20 and 15 degrees Celsius, one for the other. */
  private static final double[] GAS = {
    293.15 / 273.15, 288.15 / 273.15, 273.15 / 293.15, 273.15 / 288.15
  };

  /** Those that a residual alone can tell three times as often. */
  private static final Kind[] KINDS = {
    Kind.REVERSED,
    Kind.COUNTED_TWICE,
    Kind.RADIUS_FOR_DIAMETER,
    Kind.UNIT_SLIP,
    Kind.DENSITY_LEFT_OUT,
    Kind.REVERSED,
    Kind.COUNTED_TWICE,
    Kind.RADIUS_FOR_DIAMETER,
    Kind.UNIT_SLIP,
    Kind.DENSITY_LEFT_OUT,
    Kind.REVERSED,
    Kind.COUNTED_TWICE,
    Kind.RADIUS_FOR_DIAMETER,
    Kind.UNIT_SLIP,
    Kind.DENSITY_LEFT_OUT,
    Kind.STALE_LEVEL,
    Kind.ONE_METER_BIAS,
    Kind.LEAK,
    Kind.LEFT_OUT
  };

  /** How a flow is stated. */
  private enum Form {
    FIGURE,
    BORE,
    DENSITY_TIMES
  }

  /** One nozzle: what truly flows out, and what is stated of it but for noise. */
  private static final class Nozzle {
    private final int sign;
    private final double truth;
    private final double relative;
    private final Form form;
    private double stated;

    Nozzle(int sign, double truth, double relative, Form form) {
      this.sign = sign;
      this.truth = truth;
      this.relative = relative;
      this.form = form;
      this.stated = truth;
    }

    double outward() {
      return sign * stated;
    }
  }

  private static final class Tank {
    private final Random random;
    private final List<Nozzle> nozzles = new ArrayList<>();
    private final boolean mass;
    private boolean level;
    private double kept;
    private double keptStated;
    private double keptUncertainty;
    private Kind kind = Kind.LEAK;
    private int culprit = -1;

    Tank(Random random) {
      this.random = random;
      this.mass = random.nextInt(5) == 0;
      int count = 3 + random.nextInt(10);
      double in = 0;
      double out = 0;
      for (int k = 0; k < count - 1; k++) {
        int sign = k == 0 ? -1 : random.nextBoolean() ? 1 : -1;
        double truth = Math.exp(Math.log(0.05) + random.nextDouble() * Math.log(1000));
        in += sign < 0 ? truth : 0;
        out += sign > 0 ? truth : 0;
        nozzles.add(nozzle(sign, truth));
      }
      level = random.nextBoolean();
      kept = level ? 0.2 * (random.nextDouble() - 0.5) * (in + out) : 0;
      keptStated = kept;
      keptUncertainty = level ? 0.02 * Math.abs(kept) + 0.002 * in : 0;
      double rest = in - out - kept;
      nozzles.add(nozzle(rest > 0 ? 1 : -1, Math.abs(rest)));
    }

    private Nozzle nozzle(int sign, double truth) {
      Form form =
          mass
              ? random.nextBoolean() ? Form.DENSITY_TIMES : Form.FIGURE
              : random.nextInt(4) == 0 ? Form.BORE : Form.FIGURE;
      return new Nozzle(sign, truth, 0.002 + 0.028 * random.nextDouble(), form);
    }

    double uncertainty() {
      double sum = keptUncertainty * keptUncertainty;
      for (Nozzle n : nozzles) {
        sum += n.stated * n.stated * n.relative * n.relative;
      }
      return Math.sqrt(sum);
    }

    double residual() {
      return nozzles.stream().mapToDouble(Nozzle::outward).sum() + keptStated;
    }

    /** Plants a fault; false where it can't be planted here, or is of no fitting size. */
    boolean plant(Kind planted) {
      kind = planted;
      culprit = random.nextInt(nozzles.size());
      Nozzle n = nozzles.get(culprit);
      double u = uncertainty();
      double amount = (random.nextBoolean() ? 1 : -1) * u * (3 + 27 * random.nextDouble());
      switch (planted) {
        case REVERSED -> n.stated = -n.truth;
        case COUNTED_TWICE -> nozzles.add(new Nozzle(n.sign, n.truth, n.relative, n.form));
        case RADIUS_FOR_DIAMETER -> n.stated = n.truth * (random.nextBoolean() ? 4 : 0.25);
        case UNIT_SLIP -> n.stated = n.truth / UNITS[random.nextInt(UNITS.length)];
        case DENSITY_LEFT_OUT -> n.stated = n.truth * 1000 / DENSITY;
        case STALE_LEVEL -> keptStated += amount;
        case ONE_METER_BIAS -> n.stated += amount;
        default -> nozzles.add(0, new Nozzle(0, 0, 0, Form.FIGURE));
      }
      boolean possible =
          switch (planted) {
            case RADIUS_FOR_DIAMETER -> n.form == Form.BORE;
            case UNIT_SLIP -> n.form == Form.FIGURE && !mass;
            case DENSITY_LEFT_OUT ->
                n.form == Form.FIGURE
                    && nozzles.stream().anyMatch(o -> o.form == Form.DENSITY_TIMES);
            case STALE_LEVEL -> level;
            case ONE_METER_BIAS -> Math.abs(amount) < 0.5 * n.truth;
            default -> true;
          };
      if (planted == Kind.LEAK || planted == Kind.LEFT_OUT) {
        // Nothing is stated of it: the nozzles do not close by as much.
        nozzles.remove(0);
        culprit = -1;
        nozzles.set(0, shifted(nozzles.get(0), amount));
      }
      double size = Math.abs(residual()) / uncertainty();
      return possible && size >= 3 && size <= 30;
    }

    private static Nozzle shifted(Nozzle n, double amount) {
      return new Nozzle(n.sign, n.truth - n.sign * amount, n.relative, n.form);
    }

    /** The residuals that suppositions without a free number predict, but for noise. */
    private void predict(int nozzle, List<Double> predicted) {
      Nozzle n = nozzles.get(nozzle);
      double now = residual();
      List<Double> factors = new ArrayList<>(List.of(-1.0, 0.0));
      if (n.form == Form.BORE) {
        factors.add(4.0);
        factors.add(0.25);
      } else if (n.form == Form.FIGURE && mass) {
        Arrays.stream(MASS_UNITS).forEach(factors::add);
        if (nozzles.stream().anyMatch(o -> o.form == Form.DENSITY_TIMES)) {
          factors.add(DENSITY / 1000);
        }
      } else {
        Arrays.stream(UNITS).forEach(factors::add);
        if (!level) {
          Arrays.stream(GAS).forEach(factors::add);
        }
      }
      factors.forEach(f -> predicted.add(now + (f - 1) * n.outward()));
    }

    /** Whether every other supposition of the same or less complexity predicts one far off. */
    boolean canTell() {
      if (kind.ordinal() >= Kind.STALE_LEVEL.ordinal()) {
        // Any one fitted number closes the balance.
        return false;
      }
      List<Double> predicted = new ArrayList<>();
      for (int k = 0; k < nozzles.size(); k++) {
        predict(k, predicted);
      }
      double u = uncertainty();
      long near = predicted.stream().filter(p -> Math.abs(p) < APART * u).count();
      // A nozzle that is there twice predicts the same twice.
      return near == (kind == Kind.COUNTED_TWICE ? 2 : 1);
    }

    String yaml() {
      StringBuilder text = new StringBuilder("format: hullsum-case/1\nquantity: ");
      text.append(mass ? "mass\n" : "volume\n").append("parameters:\n  rho: ");
      text.append(DENSITY).append(" kg/m3\n");
      String unit = mass ? "kg/h" : "m3/h";
      StringBuilder patches = new StringBuilder();
      for (int k = 0; k < nozzles.size(); k++) {
        Nozzle n = nozzles.get(k);
        double read = n.stated + n.truth * n.relative * random.nextGaussian() * scale(n);
        String percent = " ± " + 100 * n.relative + " % (k=1)";
        patches.append("  n").append(k).append(": {");
        patches.append(n.sign > 0 ? "leaves" : "enters").append(": tank, flux: {metered: ");
        switch (n.form) {
          case FIGURE -> patches.append(read).append(' ').append(unit).append(percent);
          case DENSITY_TIMES ->
              patches.append(read / DENSITY).append(" m3/h").append(percent).append(", times: rho");
          case BORE -> {
            double bore = 0.1;
            boolean mistaken = kind == Kind.RADIUS_FOR_DIAMETER && k == culprit;
            double wrong = mistaken ? n.stated / n.truth : 1;
            double speed = read / wrong / 3600 / (Math.PI * bore * bore / 4);
            double shown = bore * Math.sqrt(wrong);
            text.append("  v").append(k).append(": ").append(speed).append(" m/s").append(percent);
            text.append("\n  d").append(k).append(": ").append(shown).append(" m\n");
            patches.append("\"v").append(k).append("*pi*d").append(k).append("^2/4\"");
          }
        }
        patches.append("}}\n");
      }
      text.append("volumes:\n  tank: {");
      if (level) {
        double read = keptStated + keptUncertainty * random.nextGaussian();
        text.append("interior: {accumulation: ").append(read).append(' ').append(unit);
        text.append(" ± ").append(keptUncertainty).append(' ').append(unit).append(" (k=1)}");
      }
      return text.append("}\npatches:\n").append(patches).toString();
    }

    private static double scale(Nozzle n) {
      return n.truth == 0 ? 1 : Math.abs(n.stated / n.truth);
    }

    boolean isPlanted(Explanation e) {
      boolean named = culprit < 0 || kind == Kind.STALE_LEVEL || e.on().contains("n" + culprit);
      boolean copy = kind == Kind.COUNTED_TWICE && e.on().contains("n" + (nozzles.size() - 1));
      return e.kind() == kind && (named || copy);
    }
  }

  @Test
  void plantedCauseIsFirstWhereTheDataCanTellAndElsewhereAmongThoseThatFit() {
    Map<String, int[]> counts = new TreeMap<>();
    int told = 0;
    int first = 0;
    int other = 0;
    int among = 0;
    for (int k = 0; k < TANKS; k++) {
      Kind kind = KINDS[k % KINDS.length];
      Tank tank = planted(kind, SEED + 1_000_003L * k);
      boolean canTell = tank.canTell();
      CaseResult result = Audits.audit(tank.yaml());
      if (Audits.only(result).verdict() == Verdict.BALANCED) {
        // At three standard uncertainties noise may hide it.
        continue;
      }
      List<Explanation> explanations = result.explanations();
      boolean isFirst = !explanations.isEmpty() && tank.isPlanted(explanations.get(0));
      boolean fits = explanations.stream().anyMatch(e -> e.fits() && tank.isPlanted(e));
      double size = Math.abs(tank.residual()) / tank.uncertainty();
      String row = kind.word() + (size < 10 ? ", 3 to 10 u" : ", 10 to 30 u");
      int[] count = counts.computeIfAbsent(row, n -> new int[4]);
      if (canTell) {
        told++;
        first += isFirst ? 1 : 0;
        count[0]++;
        count[1] += isFirst ? 1 : 0;
      } else {
        other++;
        among += fits ? 1 : 0;
        count[2]++;
        count[3] += fits ? 1 : 0;
      }
    }
    counts.forEach(
        (row, c) ->
            System.out.printf(
                Locale.ROOT,
                "%-33s can tell %4d first %4d; can't %4d named %4d%n",
                row,
                c[0],
                c[1],
                c[2],
                c[3]));
    System.out.printf("all: can tell %d first %d; can't %d named %d%n", told, first, other, among);
    assertTrue(told >= 200, "the data can tell in " + told);
    assertTrue(first >= PART * told, first + " first of " + told);
    assertTrue(among >= PART * other, among + " named of " + other);
  }

  private static Tank planted(Kind kind, long seed) {
    for (long attempt = 0; attempt < 20_000; attempt++) {
      Tank tank = new Tank(new Random(seed + 7919 * attempt));
      if (tank.plant(kind)) {
        return tank;
      }
    }
    throw new IllegalStateException("no tank for " + kind);
  }
}
