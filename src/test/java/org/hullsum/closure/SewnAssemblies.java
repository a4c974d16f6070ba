package org.hullsum.closure;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.hullsum.expression.VectorExpression;
import org.hullsum.flux.Assemblies;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.flux.Assemblies.Piece;
import org.hullsum.geometry.Body;
import org.hullsum.geometry.ConeShape;
import org.hullsum.geometry.CylinderShape;
import org.hullsum.geometry.DiskShape;
import org.hullsum.geometry.Span;
import org.hullsum.geometry.SphereShape;
import org.hullsum.geometry.TorusShape;
import org.hullsum.numeric.Vector3;

/**
 * Closed surfaces whose patches are split at random, so that edges meet others of other lengths.
 */
public final class SewnAssemblies {
  private final Random random;

  public SewnAssemblies(Random random) {
    this.random = random;
  }

  /** One of any kind; moved at random where it has no trim, which stays where it is. */
  public Assembly next() {
    Assembly plain =
        switch (random.nextInt(9)) {
          case 0 -> box();
          case 1 -> can();
          case 2 -> frustum();
          case 3 -> ball();
          case 4 -> torus();
          case 5 -> nested();
          case 6 -> drilled();
          case 7 -> ducted();
          default -> Assemblies.branch();
        };
    boolean trimmed = plain.pieces().stream().anyMatch(p -> p.surface().trim().isPresent());
    return trimmed ? plain : Assemblies.moved(plain, Assemblies.randomPlacement(random));
  }

  private double size() {
    return 0.4 + random.nextDouble();
  }

  /** 0 = first, …, 1 = last, between 1 and {@code most} parts. */
  private double[] parts(int most) {
    double[] parts = new double[2 + random.nextInt(most)];
    for (int k = 0; k < parts.length; k++) {
      double shift = k == 0 || k == parts.length - 1 ? 0 : 0.4 * random.nextDouble();
      parts[k] = (k + shift) / (parts.length - 1);
    }
    return parts;
  }

  /** Sectors that make a full turn, or none where it is whole. */
  private List<Optional<Span>> sectors(int most) {
    double[] parts = parts(most);
    List<Optional<Span>> sectors = new ArrayList<>();
    double start = 2 * Math.PI * random.nextDouble();
    for (int k = 1; k < parts.length; k++) {
      sectors.add(
          parts.length == 2
              ? Optional.empty()
              : Optional.of(
                  Span.of(start + 2 * Math.PI * parts[k - 1], start + 2 * Math.PI * parts[k])));
    }
    return sectors;
  }

  Assembly box() {
    double a = size();
    double b = size();
    double c = size();
    List<Piece> pieces = new ArrayList<>();
    Assembly whole = Assemblies.box(new Vector3(-a, -b, -c), new Vector3(a, b, c));
    Vector3[][] faces = {
      {new Vector3(-a, -b, -c), Vector3.Y.times(2 * b), Vector3.X.times(2 * a)},
      {new Vector3(-a, -b, c), Vector3.X.times(2 * a), Vector3.Y.times(2 * b)},
      {new Vector3(-a, -b, -c), Vector3.Z.times(2 * c), Vector3.Y.times(2 * b)},
      {new Vector3(a, -b, -c), Vector3.Y.times(2 * b), Vector3.Z.times(2 * c)},
      {new Vector3(-a, -b, -c), Vector3.X.times(2 * a), Vector3.Z.times(2 * c)},
      {new Vector3(-a, b, -c), Vector3.Z.times(2 * c), Vector3.X.times(2 * a)}
    };
    for (Vector3[] face : faces) {
      addGrid(face, pieces);
    }
    return new Assembly("box", pieces, whole.volume());
  }

  private void addGrid(Vector3[] face, List<Piece> pieces) {
    double[] across = parts(3);
    double[] up = parts(2);
    for (int i = 1; i < across.length; i++) {
      for (int j = 1; j < up.length; j++) {
        Vector3 corner = face[0].plus(face[1].times(across[i - 1])).plus(face[2].times(up[j - 1]));
        pieces.add(
            new Piece(
                Assemblies.rectangle(
                    corner,
                    face[1].times(across[i] - across[i - 1]),
                    face[2].times(up[j] - up[j - 1])),
                1));
      }
    }
  }

  private void addCap(Vector3 centre, Vector3 normal, double radius, List<Piece> pieces) {
    boolean ringed = random.nextBoolean();
    double hole = radius * (0.3 + 0.4 * random.nextDouble());
    addDisks(centre, normal, radius, ringed ? hole : 0, pieces);
    if (ringed) {
      addDisks(centre, normal, hole, 0, pieces);
    }
  }

  private void addDisks(
      Vector3 centre, Vector3 normal, double radius, double hole, List<Piece> pieces) {
    for (Optional<Span> sector : sectors(4)) {
      pieces.add(
          new Piece(
              Assemblies.build(
                  new DiskShape(
                      VectorExpression.of(centre),
                      normal,
                      Assemblies.number(radius),
                      hole > 0 ? Optional.of(Assemblies.number(hole)) : Optional.empty(),
                      sector,
                      Optional.empty())),
              1));
    }
  }

  Assembly can() {
    double radius = size();
    double height = 2 * size();
    List<Piece> pieces = new ArrayList<>();
    double[] levels = parts(3);
    for (int k = 1; k < levels.length; k++) {
      for (Optional<Span> sector : sectors(4)) {
        pieces.add(
            new Piece(
                Assemblies.build(
                    new CylinderShape(
                        Assemblies.point(0, 0, height * levels[k - 1]),
                        Assemblies.point(0, 0, height * levels[k]),
                        Assemblies.number(radius),
                        sector,
                        Optional.empty())),
                1));
      }
    }
    addCap(Vector3.ZERO, Vector3.Z.negated(), radius, pieces);
    addCap(Vector3.Z.times(height), Vector3.Z, radius, pieces);
    return new Assembly("can", pieces, Math.PI * radius * radius * height);
  }

  Assembly frustum() {
    double low = size();
    double high = random.nextBoolean() ? 0 : 0.7 * size();
    double height = size();
    List<Piece> pieces = new ArrayList<>();
    for (Optional<Span> sector : sectors(5)) {
      pieces.add(
          new Piece(
              Assemblies.build(
                  new ConeShape(
                      Assemblies.point(0, 0, 0),
                      Assemblies.point(0, 0, height),
                      Assemblies.number(low),
                      Assemblies.number(high),
                      sector,
                      Optional.empty())),
              1));
    }
    addCap(Vector3.ZERO, Vector3.Z.negated(), low, pieces);
    if (high > 0) {
      addCap(Vector3.Z.times(height), Vector3.Z, high, pieces);
    }
    return new Assembly(
        "frustum", pieces, Math.PI * height * (low * low + low * high + high * high) / 3);
  }

  private void addSphere(Vector3 centre, double radius, int outward, List<Piece> pieces) {
    double[] bands = parts(3);
    for (int k = 1; k < bands.length; k++) {
      for (Optional<Span> sector : sectors(3)) {
        pieces.add(
            new Piece(
                Assemblies.build(
                    new SphereShape(
                        VectorExpression.of(centre),
                        Assemblies.number(radius),
                        Vector3.Z,
                        Optional.of(Span.of(Math.PI * bands[k - 1], Math.PI * bands[k])),
                        sector,
                        Optional.empty())),
                outward));
      }
    }
  }

  Assembly ball() {
    List<Piece> pieces = new ArrayList<>();
    double radius = size();
    addSphere(new Vector3(size(), 0, 0), radius, 1, pieces);
    return new Assembly("ball", pieces, 4 * Math.PI * Math.pow(radius, 3) / 3);
  }

  Assembly torus() {
    double ring = 1 + size();
    double tube = 0.5 * size();
    List<Piece> pieces = new ArrayList<>();
    double[] around = parts(3);
    for (int k = 1; k < around.length; k++) {
      Optional<Span> azimuth =
          around.length == 2
              ? Optional.empty()
              : Optional.of(Span.of(2 * Math.PI * around[k - 1], 2 * Math.PI * around[k]));
      for (Optional<Span> sector : sectors(3)) {
        pieces.add(
            new Piece(
                Assemblies.build(
                    new TorusShape(
                        Assemblies.point(0, 0, 0),
                        Vector3.Z,
                        Assemblies.number(ring),
                        Assemblies.number(tube),
                        azimuth,
                        sector,
                        Optional.empty())),
                1));
      }
    }
    return new Assembly("torus", pieces, 2 * Math.PI * Math.PI * ring * tube * tube);
  }

  /** A box with a ball-shaped cavity. */
  Assembly nested() {
    Assembly box = box();
    List<Piece> pieces = new ArrayList<>(box.pieces());
    double radius = 0.1 + 0.25 * random.nextDouble();
    addSphere(Vector3.ZERO, radius, -1, pieces);
    return new Assembly("nested", pieces, box.volume() - 4 * Math.PI * Math.pow(radius, 3) / 3);
  }

  /** A can with a bore along its axis. */
  Assembly drilled() {
    double outer = size();
    double inner = outer * (0.2 + 0.5 * random.nextDouble());
    double height = size();
    List<Piece> pieces = new ArrayList<>();
    for (double radius : new double[] {outer, inner}) {
      for (Optional<Span> sector : sectors(3)) {
        pieces.add(
            new Piece(
                Assemblies.build(
                    new CylinderShape(
                        Assemblies.point(0, 0, 0),
                        Assemblies.point(0, 0, height),
                        Assemblies.number(radius),
                        sector,
                        Optional.empty())),
                radius == outer ? 1 : -1));
      }
    }
    addDisks(Vector3.ZERO, Vector3.Z.negated(), outer, inner, pieces);
    addDisks(Vector3.Z.times(height), Vector3.Z, outer, inner, pieces);
    return new Assembly("drilled", pieces, Math.PI * (outer * outer - inner * inner) * height);
  }

  /** A box with a square duct on its roof, which is opened there. */
  Assembly ducted() {
    double a = 1 + size();
    double b = 1 + size();
    double side = 0.2 + 0.3 * random.nextDouble();
    double x = 0.3 + 0.3 * random.nextDouble();
    double y = 0.3 + 0.3 * random.nextDouble();
    Vector3 along = Vector3.X.times(side);
    Vector3 across = Vector3.Y.times(side);
    Vector3 up = Vector3.Z.times(0.7);
    Vector3 foot = new Vector3(x, y, 1);
    List<Piece> pieces =
        new ArrayList<>(Assemblies.box(Vector3.ZERO, new Vector3(a, b, 1)).pieces());
    pieces.remove(1);
    Body opening =
        new Body.Box(
            VectorExpression.of(foot.minus(up)),
            VectorExpression.of(along),
            VectorExpression.of(across),
            VectorExpression.of(up.times(2)));
    pieces.add(
        new Piece(
            Assemblies.trimmed(
                Assemblies.rectangle(Vector3.Z, Vector3.X.times(a), Vector3.Y.times(b)),
                List.of(),
                List.of(opening)),
            1));
    pieces.add(new Piece(Assemblies.rectangle(foot, along, up), 1));
    pieces.add(new Piece(Assemblies.rectangle(foot.plus(across), up, along), 1));
    pieces.add(new Piece(Assemblies.rectangle(foot, up, across), 1));
    pieces.add(new Piece(Assemblies.rectangle(foot.plus(along), across, up), 1));
    pieces.add(new Piece(Assemblies.rectangle(foot.plus(up), along, across), 1));
    return new Assembly("ducted", pieces, a * b + 0.7 * side * side);
  }
}
