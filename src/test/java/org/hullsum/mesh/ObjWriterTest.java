package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.StringWriter;
import java.math.BigDecimal;
import java.nio.channels.Channels;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class ObjWriterTest {
  private static final long SPREAD = 0x9E3779B97F4A7C15L;

  @Test
  void numbersHaveTheFewestDigitsThatReadBack() {
    assertEquals("0.1", ObjWriter.text(0.1));
    assertEquals("-3", ObjWriter.text(-3));
    assertEquals("0", ObjWriter.text(-0.0));
    assertEquals("2E-323", ObjWriter.text(2e-323));
    assertEquals("0.10000000149011612", ObjWriter.text(0.1f));
    Random random = new Random(SPREAD);
    for (int k = 0; k < 100_000; k++) {
      double value = Double.longBitsToDouble(random.nextLong());
      if (Double.isFinite(value)) {
        String text = ObjWriter.text(value);
        assertEquals(value, Double.parseDouble(text));
        BigDecimal usual = new BigDecimal(Double.toString(value));
        assertTrue(new BigDecimal(text).precision() <= usual.precision(), text);
      }
    }
  }

  @Test
  void meshReadsBackWithItsPartsItsTrianglesAndEveryBitOfItsCoordinates()
      throws IOException, MeshFault {
    Random random = new Random(SPREAD);
    TriangleMeshBuilder builder = new TriangleMeshBuilder();
    List<String> parts = List.of("", "outer skin", "#1", "Zuläufe", "a\\b");
    for (int t = 0; t < 500; t++) {
      builder.part(parts.get(t / 7 % parts.size()));
      int[] corners = new int[3];
      for (int k = 0; k < 3; k++) {
        double size = Math.pow(10, random.nextInt(30) - 15);
        corners[k] =
            builder.vertex(
                size * random.nextGaussian(), random.nextFloat(), random.nextInt(9) / 8.0);
      }
      builder.triangle(corners[0], corners[1], corners[2]);
    }
    TriangleMesh mesh = builder.build(1);
    StringWriter text = new StringWriter();
    ObjWriter.write(mesh, t -> t % 3 == 0, text);
    TriangleMeshBuilder copy = new TriangleMeshBuilder();
    byte[] bytes = text.toString().getBytes(StandardCharsets.UTF_8);
    ObjReader.read(Channels.newChannel(new ByteArrayInputStream(bytes)), copy);
    TriangleMesh read = copy.build(1);
    assertEquals(mesh.parts(), read.parts());
    assertEquals(mesh.triangleCount(), read.triangleCount());
    for (int t = 0; t < mesh.triangleCount(); t++) {
      assertEquals(mesh.part(t), read.part(t));
      for (int k = 0; k < 3; k++) {
        int from = t % 3 == 0 ? (3 - k) % 3 : k;
        assertEquals(mesh.vertex(mesh.corner(t, from)), read.vertex(read.corner(t, k)));
      }
    }
  }

  @Test
  void namesThatWouldNotReadBackAreTold() {
    assertTrue(ObjWriter.isName(""));
    assertTrue(ObjWriter.isName("outer skin"));
    for (String name : List.of("two\nlines", "far  apart", " before", "end\\", "x".repeat(300))) {
      assertFalse(ObjWriter.isName(name), name);
    }
  }
}
