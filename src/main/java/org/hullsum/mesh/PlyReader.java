package org.hullsum.mesh;

import java.io.IOException;
import java.nio.channels.ReadableByteChannel;
import java.util.List;
import java.util.OptionalInt;

/**
 * Reads PLY files (G. Turk, The PLY polygon file format, 1994), as text and in binary of both byte
 * orders: the points of the element {@code vertex} (x, y, z), the polygons of {@code face} and the
 * strips of {@code tristrips} (vertex_indices or vertex_index). What else is declared is passed.
 * The format has no parts and no unit.
 */
final class PlyReader {
  /** In a list of strips, ends one and begins the next. */
  private static final long NEXT_STRIP = -1;

  private static final List<String> AXES = List.of("x", "y", "z");
  private static final List<String> FACES = List.of("face", "tristrips");

  private final ScalarSource numbers;
  private final TextCursor text;
  private final PlyHeader header;
  private final FaceAccumulator faces;

  /** Faces that stand before the points: each its size, negative for strips, and its corners. */
  private final IntList held = new IntList();

  private long pointCount;
  private boolean pointsKnown;

  private PlyReader(ByteCursor bytes, TextCursor text, PlyHeader header, TriangleSink sink) {
    this.text = text;
    this.header = header;
    this.faces = new FaceAccumulator(sink);
    header.order().ifPresent(bytes::order);
    this.numbers = header.order().isPresent() ? new BinaryScalars(bytes) : new TextScalars(text);
  }

  /** Reads a file, as {@link MeshReader} says. */
  static void read(ReadableByteChannel file, TriangleSink sink) throws IOException, MeshFault {
    ByteCursor bytes = new ByteCursor(file);
    TextCursor text = new TextCursor(bytes, false);
    new PlyReader(bytes, text, PlyHeader.read(text), sink).read();
  }

  private void read() throws IOException, MeshFault {
    pointCount = checkPoints();
    checkFaces();
    PlyHeader.endLine(text);
    for (PlyHeader.Element element : header.elements()) {
      switch (element.name()) {
        case "vertex" -> readPoints(element);
        case "face", "tristrips" -> readFaces(element);
        default -> pass(element);
      }
    }
    if (numbers.hasMore()) {
      throw numbers.fault("the file goes on behind the last element that its header declares");
    }
  }

  private long checkPoints() throws MeshFault {
    PlyHeader.Element points = element("vertex");
    for (String axis : AXES) {
      if (points.properties().stream().noneMatch(property -> isNumber(property, axis))) {
        throw text.fault("element 'vertex' has no number '" + axis + "'");
      }
    }
    if (points.count() > Integer.MAX_VALUE) {
      throw text.fault(points.count() + " points are more than are read");
    }
    return points.count();
  }

  private void checkFaces() throws MeshFault {
    boolean hasFaces = false;
    for (PlyHeader.Element element : header.elements()) {
      if (FACES.contains(element.name())) {
        hasFaces = true;
        if (indexProperty(element.properties()).isEmpty()) {
          throw text.fault(
              "element '" + element.name() + "' has no list 'vertex_indices' or 'vertex_index'");
        }
      }
    }
    if (!hasFaces) {
      throw text.fault("the header declares no element 'face', so there is no surface");
    }
  }

  private PlyHeader.Element element(String name) throws MeshFault {
    for (PlyHeader.Element element : header.elements()) {
      if (element.name().equals(name)) {
        return element;
      }
    }
    throw text.fault("the header declares no element '" + name + "'");
  }

  private static boolean isNumber(PlyHeader.Property property, String name) {
    return property.name().equals(name) && property.countType().isEmpty();
  }

  private void readPoints(PlyHeader.Element element) throws IOException, MeshFault {
    PlyHeader.Property[] properties = element.properties().toArray(PlyHeader.Property[]::new);
    int[] axes = new int[properties.length];
    for (int k = 0; k < axes.length; k++) {
      boolean number = properties[k].countType().isEmpty();
      axes[k] = number ? AXES.indexOf(properties[k].name()) : -1;
    }
    double[] point = new double[3];
    for (long k = 0; k < element.count(); k++) {
      for (int p = 0; p < properties.length; p++) {
        if (axes[p] >= 0) {
          point[axes[p]] = numbers.real(properties[p].type());
        } else {
          pass(properties[p]);
        }
      }
      faces.point(point[0], point[1], point[2], numbers);
      endElement(element, k);
    }
    pointsKnown = true;
    tellHeld();
  }

  private void readFaces(PlyHeader.Element element) throws IOException, MeshFault {
    boolean strips = element.name().equals("tristrips");
    PlyHeader.Property[] properties = element.properties().toArray(PlyHeader.Property[]::new);
    int indices = indexProperty(element.properties()).orElseThrow();
    for (long k = 0; k < element.count(); k++) {
      for (int p = 0; p < properties.length; p++) {
        if (p == indices) {
          readCorners(properties[p], strips);
        } else {
          pass(properties[p]);
        }
      }
      endElement(element, k);
    }
  }

  private static OptionalInt indexProperty(List<PlyHeader.Property> properties) {
    for (int k = 0; k < properties.size(); k++) {
      String name = properties.get(k).name();
      boolean named = name.equals("vertex_indices") || name.equals("vertex_index");
      if (named && properties.get(k).countType().isPresent()) {
        return OptionalInt.of(k);
      }
    }
    return OptionalInt.empty();
  }

  private void readCorners(PlyHeader.Property property, boolean strips)
      throws IOException, MeshFault {
    long count = readCount(property);
    int start = held.size();
    begin();
    for (long k = 0; k < count; k++) {
      long corner = numbers.whole(property.type());
      if (strips && corner == NEXT_STRIP) {
        endFace(true, start);
        start = held.size();
        begin();
      } else {
        corner(corner);
      }
    }
    boolean closed = strips && (pointsKnown ? faces.corners() == 0 : held.size() == start + 1);
    if (closed) {
      held.shorten(start);
    } else {
      endFace(strips, start);
    }
  }

  private void begin() throws MeshFault {
    if (pointsKnown) {
      faces.begin();
    } else {
      held.add(0, numbers);
    }
  }

  private void corner(long corner) throws MeshFault {
    if (pointsKnown) {
      faces.corner(corner, numbers);
    } else if (corner < 0 || corner >= pointCount) {
      throw numbers.fault("point " + corner + " is not among the " + pointCount + " points");
    } else {
      held.add((int) corner, numbers);
    }
  }

  private void endFace(boolean strip, int start) throws MeshFault {
    if (pointsKnown) {
      tell(strip);
    } else {
      int size = held.size() - start - 1;
      held.set(start, strip ? -size : size);
    }
  }

  private void tell(boolean strip) throws MeshFault {
    if (strip) {
      faces.strip(numbers);
    } else {
      faces.polygon(numbers);
    }
  }

  private void tellHeld() throws MeshFault {
    for (int at = 0; at < held.size(); ) {
      int size = held.get(at++);
      faces.begin();
      for (int k = 0; k < Math.abs(size); k++) {
        faces.corner(held.get(at++), numbers);
      }
      tell(size < 0);
    }
  }

  private long readCount(PlyHeader.Property property) throws IOException, MeshFault {
    long count = numbers.whole(property.countType().orElseThrow());
    if (count < 0) {
      throw numbers.fault("a list of " + count + " numbers");
    }
    return count;
  }

  private void pass(PlyHeader.Property property) throws IOException, MeshFault {
    long count = property.countType().isPresent() ? readCount(property) : 1;
    numbers.skip(property.type(), count);
  }

  private void pass(PlyHeader.Element element) throws IOException, MeshFault {
    if (element.properties().isEmpty()) {
      return;
    }
    if (header.order().isPresent() && element.size().isPresent()) {
      int size = element.size().get();
      if (element.count() > Long.MAX_VALUE / Long.BYTES / size) {
        throw numbers.fault("element '" + element.name() + "' is larger than any file");
      }
      numbers.skip(ScalarType.INT8, element.count() * size);
      return;
    }
    for (long k = 0; k < element.count(); k++) {
      for (PlyHeader.Property property : element.properties()) {
        pass(property);
      }
      endElement(element, k);
    }
  }

  /** In text, each thing stands on a line of its own. */
  private void endElement(PlyHeader.Element element, long k) throws IOException, MeshFault {
    if (header.order().isEmpty() && text.skipBlanks()) {
      throw text.faultNext("the end of the line, behind " + element.name() + " " + k + ",");
    }
  }
}
