package org.hullsum.mesh;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import org.hullsum.numeric.Vector3;

/** Meshes for the tests. */
public final class Meshes {
  private Meshes() {}

  /** A mesh of triangles, by their corners' coordinates. */
  public static TriangleMesh of(Vector3[][] triangles) {
    TriangleMeshBuilder builder = new TriangleMeshBuilder();
    for (Vector3[] t : triangles) {
      builder.triangle(add(builder, t[0]), add(builder, t[1]), add(builder, t[2]));
    }
    return builder.build(1);
  }

  private static int add(TriangleMeshBuilder builder, Vector3 p) {
    return builder.vertex(p.x(), p.y(), p.z());
  }

  /** The 12 triangles of a box between two corners, outward. */
  public static Vector3[][] box(Vector3 low, Vector3 high) {
    Vector3[] p = new Vector3[8];
    for (int k = 0; k < 8; k++) {
      p[k] =
          new Vector3(
              (k & 1) == 0 ? low.x() : high.x(),
              (k & 2) == 0 ? low.y() : high.y(),
              (k & 4) == 0 ? low.z() : high.z());
    }
    int[][] faces = {
      {0, 2, 3, 1}, {4, 5, 7, 6}, {0, 1, 5, 4}, {2, 6, 7, 3}, {0, 4, 6, 2}, {1, 3, 7, 5}
    };
    Vector3[][] triangles = new Vector3[12][];
    for (int f = 0; f < 6; f++) {
      int[] q = faces[f];
      triangles[2 * f] = new Vector3[] {p[q[0]], p[q[1]], p[q[2]]};
      triangles[2 * f + 1] = new Vector3[] {p[q[0]], p[q[2]], p[q[3]]};
    }
    return triangles;
  }

  /** A torus about z of so many steps round the ring and round the tube, outward. */
  public static Vector3[][] torus(double ring, double tube, int around, int about) {
    Vector3[][] triangles = new Vector3[2 * around * about][];
    for (int i = 0; i < around; i++) {
      for (int j = 0; j < about; j++) {
        Vector3 a = torus(ring, tube, i, j, around, about);
        Vector3 b = torus(ring, tube, (i + 1) % around, j, around, about);
        Vector3 c = torus(ring, tube, (i + 1) % around, (j + 1) % about, around, about);
        Vector3 d = torus(ring, tube, i, (j + 1) % about, around, about);
        triangles[2 * (i * about + j)] = new Vector3[] {a, b, c};
        triangles[2 * (i * about + j) + 1] = new Vector3[] {a, c, d};
      }
    }
    return triangles;
  }

  private static Vector3 torus(double ring, double tube, int i, int j, int around, int about) {
    double p = 2 * Math.PI * i / around;
    double q = 2 * Math.PI * j / about;
    double radius = ring + tube * Math.cos(q);
    return new Vector3(radius * Math.cos(p), radius * Math.sin(p), tube * Math.sin(q));
  }

  /**
   * An icosahedron on the unit sphere, its faces divided into 4 so many times and then projected,
   * outward.
   */
  public static Vector3[][] icosphere(int level) {
    double g = (1 + Math.sqrt(5)) / 2;
    Vector3[] p = {
      new Vector3(-1, g, 0), new Vector3(1, g, 0), new Vector3(-1, -g, 0), new Vector3(1, -g, 0),
      new Vector3(0, -1, g), new Vector3(0, 1, g), new Vector3(0, -1, -g), new Vector3(0, 1, -g),
      new Vector3(g, 0, -1), new Vector3(g, 0, 1), new Vector3(-g, 0, -1), new Vector3(-g, 0, 1)
    };
    int[][] f = {
      {0, 11, 5},
      {0, 5, 1},
      {0, 1, 7},
      {0, 7, 10},
      {0, 10, 11},
      {1, 5, 9},
      {5, 11, 4},
      {11, 10, 2},
      {10, 7, 6},
      {7, 1, 8},
      {3, 9, 4},
      {3, 4, 2},
      {3, 2, 6},
      {3, 6, 8},
      {3, 8, 9},
      {4, 9, 5},
      {2, 4, 11},
      {6, 2, 10},
      {8, 6, 7},
      {9, 8, 1}
    };
    Vector3[][] triangles = new Vector3[f.length][];
    for (int k = 0; k < f.length; k++) {
      triangles[k] = new Vector3[] {p[f[k][0]], p[f[k][1]], p[f[k][2]]};
    }
    for (int l = 0; l < level; l++) {
      Vector3[][] finer = new Vector3[4 * triangles.length][];
      for (int k = 0; k < triangles.length; k++) {
        Vector3 a = triangles[k][0];
        Vector3 b = triangles[k][1];
        Vector3 c = triangles[k][2];
        Vector3 ab = a.plus(b).times(0.5);
        Vector3 bc = b.plus(c).times(0.5);
        Vector3 ca = c.plus(a).times(0.5);
        finer[4 * k] = new Vector3[] {a, ab, ca};
        finer[4 * k + 1] = new Vector3[] {b, bc, ab};
        finer[4 * k + 2] = new Vector3[] {c, ca, bc};
        finer[4 * k + 3] = new Vector3[] {ab, bc, ca};
      }
      triangles = finer;
    }
    for (Vector3[] t : triangles) {
      for (int k = 0; k < 3; k++) {
        t[k] = t[k].unit();
      }
    }
    return triangles;
  }

  /** The same triangles, those of the set turned. */
  public static Vector3[][] turned(Vector3[][] triangles, boolean[] turn) {
    Vector3[][] copy = new Vector3[triangles.length][];
    for (int k = 0; k < copy.length; k++) {
      Vector3[] t = triangles[k];
      copy[k] = turn[k] ? new Vector3[] {t[0], t[2], t[1]} : t;
    }
    return copy;
  }

  /** A closed mesh of any kind, its triangles in random order. */
  public static Vector3[][] closed(Random random) {
    Vector3[][] plain =
        switch (random.nextInt(3)) {
          case 0 -> icosphere(random.nextInt(3));
          case 1 ->
              torus(2, 0.3 + random.nextDouble(), 3 + random.nextInt(9), 3 + random.nextInt(9));
          default -> box(new Vector3(-1, -2, -3), new Vector3(1, 1 + random.nextDouble(), 1));
        };
    List<Vector3[]> list = new ArrayList<>(List.of(plain));
    Collections.shuffle(list, random);
    return list.toArray(new Vector3[0][]);
  }
}
