package org.hullsum.quadrature;

import static java.lang.Math.PI;
import static java.lang.Math.cos;
import static java.lang.Math.exp;
import static java.lang.Math.sin;
import static java.lang.Math.sqrt;

import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleBinaryOperator;

/**
 * The fluxes of six fields through five surfaces: a wavy graph, a slanted disk, a piece of a
 * sphere, a cylinder and a torus, each a chart of the unit square. Reference values by composite
 * Gauss–Legendre rules in 128-bit arithmetic, graded around peaks and split at kinks (own
 * computation, at least 17 digits).
 */
final class SurfaceFields {
  private static final String[] SURFACES = {"graph", "disk", "sphere", "cylinder", "torus"};
  private static final String[] FIELDS = {"polynomial", "mixed", "peak", "source", "waves", "kink"};
  private static final double[][] REFERENCE = {
    {
      0.0248042227504075701771542407733, 0.139182341871462249459100015412,
      0.215976497681876664324897739535, 6.29637764843385868454470821179,
      0.158519095864091904862509635227, 0.3218106301810354863814044313
    },
    {
      3.14159265358979323846264338328, 0.157079632679489661923132169164,
      0.172512762607502803595634010387, 5.93612417256265212144853579123,
      -0.00181156485181945471275122709678, 1.88911300872206774429692088601
    },
    {
      1.65224847752572320985831983808, 1.19891936435134100822036679704,
      0.200567699936899560909539798518, 7.9705510540058112494354302059,
      -0.0909607663318337744728328634748, 0.831588411918010597437081747006
    },
    {
      3.70959260535882785597668930698, 3.00963538704500682901777611742,
      0.0483073987232758355267396333096, 9.99321445731152425677427222157,
      0.403127907700425423292665679361, -0.16806793602864276901389822955
    },
    {
      11.7487770790567724998605780863, 8.52776071215049021684452370004,
      0.0613494065934928661125986968471, 12.5663706143591729538505735331,
      0.202958237362957006784564065247, 3.75054113875170470514882017407
    }
  };

  private SurfaceFields() {}

  static List<BatteryCase> cases() {
    List<BatteryCase> cases = new ArrayList<>();
    for (int surface = 0; surface < SURFACES.length; surface++) {
      for (int field = 0; field < FIELDS.length; field++) {
        int s = surface;
        double[] peak = peak(surface);
        double[] source = source(surface);
        int f = field;
        BatteryCase one =
            BatteryCase.of(
                SURFACES[surface] + ", " + FIELDS[field],
                kind(field),
                (u, v) -> flux(s, f, u, v, peak, source),
                REFERENCE[surface][field]);
        if (field == 5) {
          DoubleBinaryOperator kink = (u, v) -> chart(s, u, v)[0] - 0.3;
          one = one.switching(kink);
        }
        cases.add(one.periodic(surface >= 3, surface == 1 || surface == 4));
      }
    }
    return cases;
  }

  private static BatteryCase.Kind kind(int field) {
    switch (field) {
      case 2:
        return BatteryCase.Kind.PEAKED;
      case 3:
        return BatteryCase.Kind.NEARLY_SINGULAR;
      case 4:
        return BatteryCase.Kind.OSCILLATING;
      case 5:
        return BatteryCase.Kind.KINKED;
      default:
        return BatteryCase.Kind.SMOOTH;
    }
  }

  /** Position and the vector product of the tangents. */
  private static double[] chart(int surface, double u, double v) {
    switch (surface) {
      case 0:
        return new double[] {
          u,
          v,
          0.3 * sin(PI * u) * cos(PI * v) + 0.1 * u * v,
          -(0.3 * PI * cos(PI * u) * cos(PI * v) + 0.1 * v),
          0.3 * PI * sin(PI * u) * sin(PI * v) - 0.1 * u,
          1
        };
      case 1:
        double x = u * cos(2 * PI * v);
        double y = u * sin(2 * PI * v);
        return new double[] {x, y, 0.5 + 0.2 * x, -0.4 * PI * u, 0, 2 * PI * u};
      case 2:
        double polar = PI / 6 + PI / 3 * u;
        double azimuth = -0.3 + 1.8 * v;
        double area = sin(polar) * PI / 3 * 1.8;
        double px = sin(polar) * cos(azimuth);
        double py = sin(polar) * sin(azimuth);
        double pz = cos(polar);
        return new double[] {px, py, pz, area * px, area * py, area * pz};
      case 3:
        double c = cos(2 * PI * u);
        double s = sin(2 * PI * u);
        return new double[] {0.8 * c, 0.8 * s, 1.5 * v, 2.4 * PI * c, 2.4 * PI * s, 0};
      default:
        double ca = cos(2 * PI * u);
        double sa = sin(2 * PI * u);
        double cb = cos(2 * PI * v);
        double sb = sin(2 * PI * v);
        double w = 1 + 0.4 * cb;
        double k = 1.6 * PI * PI * w;
        return new double[] {w * ca, w * sa, 0.4 * sb, k * cb * ca, k * cb * sa, k * sb};
    }
  }

  private static double[] peak(int surface) {
    return chart(surface, 0.37, 0.41);
  }

  /** A point 1/20 below the surface. */
  private static double[] source(int surface) {
    double[] p = chart(surface, 0.37, 0.41);
    double length = sqrt(p[3] * p[3] + p[4] * p[4] + p[5] * p[5]);
    return new double[] {
      p[0] - p[3] / length / 20, p[1] - p[4] / length / 20, p[2] - p[5] / length / 20
    };
  }

  private static double flux(
      int surface, int field, double u, double v, double[] peak, double[] source) {
    double[] p = chart(surface, u, v);
    double x = p[0];
    double y = p[1];
    double z = p[2];
    switch (field) {
      case 0:
        return (x * x * x + y * y) * p[3] + y * z * z * p[4] + (z * z * x + 2 * z) * p[5];
      case 1:
        return (x * x * x + sin(y)) * p[3] + y * exp(-z) * p[4] + z * z * x * p[5];
      case 2:
        double a = x - peak[0];
        double b = y - peak[1];
        double c = z - peak[2];
        return exp(-50 * (a * a + b * b + c * c)) * (p[3] + 2 * p[4] + 3 * p[5]);
      case 3:
        double d = x - source[0];
        double e = y - source[1];
        double g = z - source[2];
        double q = d * d + e * e + g * g;
        return (d * p[3] + e * p[4] + g * p[5]) / (q * sqrt(q));
      case 4:
        return sin(20 * x) * cos(15 * y) * p[3]
            + cos(20 * y * z) * p[4]
            + sin(25 * z + 5 * x) * p[5];
      default:
        return Math.abs(x - 0.3) * (p[3] + y * p[4] + (z + 1) * p[5]);
    }
  }
}
