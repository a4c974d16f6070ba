package org.hullsum.mesh;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.channels.Channels;
import java.nio.channels.ReadableByteChannel;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.hullsum.numeric.Vector3;

/** Writes down what a reader tells, and refuses what breaks the sink's promises. */
final class RecordedTriangles implements TriangleSink {
  private final Map<Vector3, Integer> numbers = new HashMap<>();
  private final List<Vector3> points = new ArrayList<>();
  private final List<int[]> triangles = new ArrayList<>();
  private final List<String> parts = new ArrayList<>();

  static RecordedTriangles of(MeshReader reader, byte[] file) throws IOException, MeshFault {
    RecordedTriangles sink = new RecordedTriangles();
    reader.read(channel(file), sink);
    return sink;
  }

  static RecordedTriangles of(MeshReader reader, String file) throws IOException, MeshFault {
    return of(reader, file.getBytes(StandardCharsets.UTF_8));
  }

  static ReadableByteChannel channel(byte[] file) {
    return Channels.newChannel(new ByteArrayInputStream(file));
  }

  @Override
  public void part(String name) {
    parts.add(triangles.size() + ":" + name);
  }

  @Override
  public int vertex(double x, double y, double z) {
    return numbers.computeIfAbsent(
        new Vector3(x + 0.0, y + 0.0, z + 0.0),
        point -> {
          points.add(point);
          return points.size() - 1;
        });
  }

  @Override
  public void triangle(int a, int b, int c) {
    for (int corner : new int[] {a, b, c}) {
      if (corner < 0 || corner >= points.size()) {
        throw new IllegalStateException("vertex " + corner + " of " + points.size());
      }
    }
    triangles.add(new int[] {a, b, c});
  }

  /** Each part as the triangles before it and its name. */
  List<String> parts() {
    return parts;
  }

  int pointCount() {
    return points.size();
  }

  int triangleCount() {
    return triangles.size();
  }

  /** The corners of each triangle, in brackets. */
  String corners() {
    StringBuilder all = new StringBuilder();
    for (int[] t : triangles) {
      all.append('(').append(t[0]).append(' ').append(t[1]).append(' ').append(t[2]).append(')');
    }
    return all.toString();
  }

  double volume() {
    double sum = 0;
    for (int[] t : triangles) {
      sum += points.get(t[0]).dot(points.get(t[1]).cross(points.get(t[2]))) / 6;
    }
    return sum;
  }

  Vector3 areaVector() {
    Vector3 sum = new Vector3(0, 0, 0);
    for (int[] t : triangles) {
      sum = sum.plus(areaVector(t));
    }
    return sum;
  }

  double area() {
    return triangles.stream().mapToDouble(t -> areaVector(t).norm()).sum();
  }

  double smallestArea() {
    return triangles.stream().mapToDouble(t -> areaVector(t).norm()).min().orElseThrow();
  }

  private Vector3 areaVector(int[] t) {
    Vector3 a = points.get(t[0]);
    return points.get(t[1]).minus(a).cross(points.get(t[2]).minus(a)).times(0.5);
  }
}
