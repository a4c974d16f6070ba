import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.net.URL;
import java.net.URLClassLoader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;
import org.objectweb.asm.ClassReader;
import org.objectweb.asm.ClassVisitor;
import org.objectweb.asm.ClassWriter;
import org.objectweb.asm.Handle;
import org.objectweb.asm.Label;
import org.objectweb.asm.MethodVisitor;
import org.objectweb.asm.Opcodes;
import org.objectweb.asm.Type;

/**
 * Finishes the program's jar so that two builds give the same bytes and a start is quick.
 *
 * <p>Entries are sorted by name behind the manifest and carry one time. Class files older than Java
 * 7 are raised to the version of Java 8, stack maps included: class-data sharing passes over those
 * older than Java 6, the command-line library has such, and with them in the archive a start takes
 * about 60 ms less. In our own classes the lambdas become classes and the records' {@code equals}
 * and {@code hashCode} become code, see {@link Linker}.
 *
 * <p>Run by the build: {@code java -cp ASM FinishJar.java JAR INSTANT}.
 */
public final class FinishJar {
  /** Class files from this version on carry stack maps and are left alone. */
  private static final int FIRST_WITH_STACK_MAPS = Opcodes.V1_7;

  private static final String MANIFEST = "META-INF/MANIFEST.MF";

  private FinishJar() {}

  /** Rewrites the jar that the first argument names, with the time of the second. */
  public static void main(String[] arguments) throws IOException {
    Path jar = Path.of(arguments[0]);
    LocalDateTime time = LocalDateTime.ofInstant(Instant.parse(arguments[1]), ZoneOffset.UTC);
    Path finished = jar.resolveSibling(jar.getFileName() + ".part");
    Map<String, byte[]> entries = entries(jar);
    new Linker(entries).run();
    try (URLClassLoader classes = new URLClassLoader(new URL[] {jar.toUri().toURL()});
        OutputStream file = Files.newOutputStream(finished);
        ZipOutputStream out = new ZipOutputStream(file)) {
      for (Map.Entry<String, byte[]> entry : entries.entrySet()) {
        ZipEntry copy = new ZipEntry(entry.getKey());
        copy.setTimeLocal(time);
        out.putNextEntry(copy);
        boolean isClass = entry.getKey().endsWith(".class");
        out.write(isClass ? raised(entry.getValue(), classes) : entry.getValue());
        out.closeEntry();
      }
    }
    Files.move(finished, jar, StandardCopyOption.REPLACE_EXISTING);
  }

  private static Map<String, byte[]> entries(Path jar) throws IOException {
    Map<String, byte[]> entries =
        new TreeMap<>(
            Comparator.comparing((String name) -> !name.equals(MANIFEST))
                .thenComparing(Comparator.naturalOrder()));
    try (ZipInputStream in =
        new ZipInputStream(new BufferedInputStream(Files.newInputStream(jar)))) {
      for (ZipEntry entry = in.getNextEntry(); entry != null; entry = in.getNextEntry()) {
        if (!entry.isDirectory()) {
          entries.put(entry.getName(), in.readAllBytes());
        }
      }
    }
    return entries;
  }

  private static byte[] raised(byte[] bytes, ClassLoader classes) {
    int version = (bytes[6] & 0xFF) << 8 | bytes[7] & 0xFF;
    if (version >= FIRST_WITH_STACK_MAPS) {
      return bytes;
    }
    ClassWriter writer =
        new ClassWriter(ClassWriter.COMPUTE_FRAMES) {
          @Override
          protected ClassLoader getClassLoader() {
            return classes;
          }
        };
    new ClassReader(bytes)
        .accept(
            new ClassVisitor(Opcodes.ASM9, writer) {
              @Override
              public void visit(
                  int old, int access, String name, String signature, String up, String[] all) {
                super.visit(Opcodes.V1_8, access, name, signature, up, all);
              }
            },
            ClassReader.SKIP_FRAMES);
    return writer.toByteArray();
  }

  /**
   * Does at build time what the Java machine would do at the first use of each lambda and of each
   * record's comparison: a lambda takes it 80 µs, a class from the archive 15 µs (JDK 17, measured
   * with 500 of each), and an audit uses some 500 lambdas.
   *
   * <p>Each call of the lambda factory becomes a call of the static method {@code make} of a small
   * class of the same nest, which holds what was captured and calls the same method. Serializable
   * lambdas and the text form of records are left as they are.
   */
  private static final class Linker {
    private static final String OURS = "org/hullsum/";
    private static final String END = ".class";
    private static final String LAMBDAS = "java/lang/invoke/LambdaMetafactory";
    private static final String RECORDS = "java/lang/runtime/ObjectMethods";

    private final Map<String, byte[]> entries;
    private final Map<String, byte[]> made = new TreeMap<>();
    private final Map<String, List<String>> members = new TreeMap<>();

    Linker(Map<String, byte[]> entries) {
      this.entries = entries;
    }

    void run() {
      entries.replaceAll((name, bytes) -> isOurs(name) ? linked(bytes) : bytes);
      members.forEach(
          (host, names) -> entries.computeIfPresent(host + END, (k, b) -> withMembers(b, names)));
      entries.putAll(made);
    }

    private static boolean isOurs(String name) {
      return name.startsWith(OURS) && name.endsWith(END);
    }

    private byte[] linked(byte[] bytes) {
      ClassReader reader = new ClassReader(bytes);
      ClassWriter writer = new ClassWriter(reader, 0);
      reader.accept(new LinkedClass(writer), 0);
      return writer.toByteArray();
    }

    private static byte[] withMembers(byte[] bytes, List<String> names) {
      ClassReader reader = new ClassReader(bytes);
      ClassWriter writer = new ClassWriter(reader, 0);
      reader.accept(writer, 0);
      names.forEach(writer::visitNestMember);
      return writer.toByteArray();
    }

    /** One class with its calls replaced. */
    private final class LinkedClass extends ClassVisitor {
      private String name;
      private String host;
      private int lambdas;

      LinkedClass(ClassVisitor next) {
        super(Opcodes.ASM9, next);
      }

      @Override
      public void visit(int v, int access, String own, String sign, String up, String[] all) {
        name = own;
        host = own;
        super.visit(v, access, own, sign, up, all);
      }

      @Override
      public void visitNestHost(String nestHost) {
        host = nestHost;
        super.visitNestHost(nestHost);
      }

      @Override
      public MethodVisitor visitMethod(int access, String m, String d, String s, String[] e) {
        return new MethodVisitor(Opcodes.ASM9, super.visitMethod(access, m, d, s, e)) {
          private boolean written;

          @Override
          public void visitInvokeDynamicInsn(String n, String type, Handle by, Object... with) {
            if (by.getOwner().equals(LAMBDAS) && by.getName().equals("metafactory")) {
              String lambda = name + "$$Lambda" + lambdas++;
              LambdaClass made = new LambdaClass(lambda, host, n, type);
              Linker.this.made.put(
                  lambda + END, made.bytes((Type) with[0], (Handle) with[1], (Type) with[2]));
              members.computeIfAbsent(host, k -> new ArrayList<>()).add(lambda);
              super.visitMethodInsn(Opcodes.INVOKESTATIC, lambda, "make", type, false);
            } else if (by.getOwner().equals(RECORDS) && !n.equals("toString")) {
              new RecordMethod(name, mv, Arrays.copyOfRange(with, 2, with.length)).write(n);
              written = true;
            } else {
              super.visitInvokeDynamicInsn(n, type, by, with);
            }
          }

          @Override
          public void visitMaxs(int stack, int locals) {
            super.visitMaxs(
                written ? RecordMethod.STACK : stack, written ? RecordMethod.LOCALS : locals);
          }
        };
      }
    }
  }

  /** A class that stands for one lambda. */
  private static final class LambdaClass {
    private final String name;
    private final String method;
    private final Type target;
    private final Type[] captured;
    private final ClassWriter writer = new ClassWriter(ClassWriter.COMPUTE_MAXS);

    LambdaClass(String name, String host, String method, String type) {
      this.name = name;
      this.method = method;
      this.target = Type.getReturnType(type);
      this.captured = Type.getArgumentTypes(type);
      int access = Opcodes.ACC_FINAL | Opcodes.ACC_SUPER | Opcodes.ACC_SYNTHETIC;
      String[] interfaces = {target.getInternalName()};
      writer.visit(Opcodes.V17, access, name, null, "java/lang/Object", interfaces);
      writer.visitNestHost(host);
    }

    /**
     * @param erased the interface method's type
     * @param body the method that does the work
     * @param called the types with which it is called
     */
    byte[] bytes(Type erased, Handle body, Type called) {
      for (int i = 0; i < captured.length; i++) {
        int access = Opcodes.ACC_PRIVATE | Opcodes.ACC_FINAL;
        writer.visitField(access, "c" + i, captured[i].getDescriptor(), null, null).visitEnd();
      }
      constructor();
      factory();
      call(erased, body, called);
      writer.visitEnd();
      return writer.toByteArray();
    }

    private String constructorType() {
      return Type.getMethodDescriptor(Type.VOID_TYPE, captured);
    }

    private void constructor() {
      MethodVisitor to =
          writer.visitMethod(Opcodes.ACC_PRIVATE, "<init>", constructorType(), null, null);
      to.visitCode();
      to.visitVarInsn(Opcodes.ALOAD, 0);
      to.visitMethodInsn(Opcodes.INVOKESPECIAL, "java/lang/Object", "<init>", "()V", false);
      int at = 1;
      for (int i = 0; i < captured.length; i++) {
        to.visitVarInsn(Opcodes.ALOAD, 0);
        to.visitVarInsn(captured[i].getOpcode(Opcodes.ILOAD), at);
        to.visitFieldInsn(Opcodes.PUTFIELD, name, "c" + i, captured[i].getDescriptor());
        at += captured[i].getSize();
      }
      to.visitInsn(Opcodes.RETURN);
      to.visitMaxs(0, 0);
      to.visitEnd();
    }

    private void factory() {
      String type = Type.getMethodDescriptor(target, captured);
      if (captured.length == 0) {
        String only = "L" + name + ";";
        int constant = Opcodes.ACC_PRIVATE | Opcodes.ACC_STATIC | Opcodes.ACC_FINAL;
        writer.visitField(constant, "ONLY", only, null, null).visitEnd();
        MethodVisitor first = writer.visitMethod(Opcodes.ACC_STATIC, "<clinit>", "()V", null, null);
        first.visitCode();
        create(first);
        first.visitFieldInsn(Opcodes.PUTSTATIC, name, "ONLY", only);
        first.visitInsn(Opcodes.RETURN);
        first.visitMaxs(0, 0);
        first.visitEnd();
      }
      MethodVisitor to = writer.visitMethod(Opcodes.ACC_STATIC, "make", type, null, null);
      to.visitCode();
      if (captured.length == 0) {
        to.visitFieldInsn(Opcodes.GETSTATIC, name, "ONLY", "L" + name + ";");
      } else {
        create(to);
      }
      to.visitInsn(Opcodes.ARETURN);
      to.visitMaxs(0, 0);
      to.visitEnd();
    }

    private void create(MethodVisitor to) {
      to.visitTypeInsn(Opcodes.NEW, name);
      to.visitInsn(Opcodes.DUP);
      int at = 0;
      for (Type type : captured) {
        to.visitVarInsn(type.getOpcode(Opcodes.ILOAD), at);
        at += type.getSize();
      }
      to.visitMethodInsn(Opcodes.INVOKESPECIAL, name, "<init>", constructorType(), false);
    }

    private void call(Type erased, Handle body, Type called) {
      MethodVisitor to =
          writer.visitMethod(Opcodes.ACC_PUBLIC, method, erased.getDescriptor(), null, null);
      to.visitCode();
      boolean creates = body.getTag() == Opcodes.H_NEWINVOKESPECIAL;
      if (creates) {
        to.visitTypeInsn(Opcodes.NEW, body.getOwner());
        to.visitInsn(Opcodes.DUP);
      }
      List<Type> wanted = new ArrayList<>();
      if (!creates && body.getTag() != Opcodes.H_INVOKESTATIC) {
        wanted.add(Type.getObjectType(body.getOwner()));
      }
      wanted.addAll(List.of(Type.getArgumentTypes(body.getDesc())));
      for (int i = 0; i < captured.length; i++) {
        to.visitVarInsn(Opcodes.ALOAD, 0);
        to.visitFieldInsn(Opcodes.GETFIELD, name, "c" + i, captured[i].getDescriptor());
      }
      Type[] given = Type.getArgumentTypes(erased.getDescriptor());
      Type[] exact = Type.getArgumentTypes(called.getDescriptor());
      int at = 1;
      for (int i = 0; i < given.length; i++) {
        to.visitVarInsn(given[i].getOpcode(Opcodes.ILOAD), at);
        at += given[i].getSize();
        Conversion.write(to, given[i], exact[i]);
        Conversion.write(to, exact[i], wanted.get(captured.length + i));
      }
      invoke(to, body);
      Type result =
          creates ? Type.getObjectType(body.getOwner()) : Type.getReturnType(body.getDesc());
      Type back = Type.getReturnType(erased.getDescriptor());
      Conversion.write(to, result, back);
      to.visitInsn(back.getOpcode(Opcodes.IRETURN));
      to.visitMaxs(0, 0);
      to.visitEnd();
    }

    private static void invoke(MethodVisitor to, Handle body) {
      int opcode =
          switch (body.getTag()) {
            case Opcodes.H_INVOKESTATIC -> Opcodes.INVOKESTATIC;
            case Opcodes.H_NEWINVOKESPECIAL -> Opcodes.INVOKESPECIAL;
            default -> body.isInterface() ? Opcodes.INVOKEINTERFACE : Opcodes.INVOKEVIRTUAL;
          };
      to.visitMethodInsn(
          opcode, body.getOwner(), body.getName(), body.getDesc(), body.isInterface());
    }
  }

  /** Turns a value on the stack into another type, as the lambda factory does. */
  private static final class Conversion {
    private static final Map<String, String> BOXES =
        Map.of(
            "Z",
            "Boolean",
            "B",
            "Byte",
            "C",
            "Character",
            "S",
            "Short",
            "I",
            "Integer",
            "J",
            "Long",
            "F",
            "Float",
            "D",
            "Double");

    private Conversion() {}

    static void write(MethodVisitor to, Type from, Type into) {
      if (from.equals(into)) {
        return;
      }
      boolean primitive = from.getSort() < Type.ARRAY;
      if (into.getSort() == Type.VOID) {
        to.visitInsn(from.getSize() == 2 ? Opcodes.POP2 : Opcodes.POP);
      } else if (primitive && into.getSort() < Type.ARRAY) {
        widen(to, from, into);
      } else if (primitive) {
        String box = box(from);
        String type = "(" + from.getDescriptor() + ")L" + box + ";";
        to.visitMethodInsn(Opcodes.INVOKESTATIC, box, "valueOf", type, false);
      } else if (into.getSort() < Type.ARRAY) {
        String box = box(into);
        to.visitTypeInsn(Opcodes.CHECKCAST, box);
        String value = into.getClassName() + "Value";
        to.visitMethodInsn(Opcodes.INVOKEVIRTUAL, box, value, "()" + into.getDescriptor(), false);
      } else if (!into.getInternalName().equals("java/lang/Object")) {
        to.visitTypeInsn(Opcodes.CHECKCAST, into.getInternalName());
      }
    }

    private static String box(Type primitive) {
      return "java/lang/" + BOXES.get(primitive.getDescriptor());
    }

    private static void widen(MethodVisitor to, Type from, Type into) {
      switch (from.getDescriptor() + into.getDescriptor()) {
        case "IJ", "SJ", "BJ", "CJ" -> to.visitInsn(Opcodes.I2L);
        case "ID", "SD", "BD", "CD" -> to.visitInsn(Opcodes.I2D);
        case "IF", "SF", "BF", "CF" -> to.visitInsn(Opcodes.I2F);
        case "JD" -> to.visitInsn(Opcodes.L2D);
        case "JF" -> to.visitInsn(Opcodes.L2F);
        case "FD" -> to.visitInsn(Opcodes.F2D);
        case "SI", "BI", "CI", "BS" -> {}
        default -> throw new IllegalArgumentException(from + " does not widen to " + into);
      }
    }
  }

  /** A record's {@code equals} or {@code hashCode}, in place of the call that would make it. */
  private static final class RecordMethod {
    /** Two doubles are compared at most; three variables: the two objects, and one of them cast. */
    static final int STACK = 4;

    static final int LOCALS = 3;

    private final String name;
    private final MethodVisitor to;
    private final Object[] fields;

    RecordMethod(String name, MethodVisitor to, Object[] fields) {
      this.name = name;
      this.to = to;
      this.fields = fields;
    }

    /** With the record, and for {@code equals} the other object above it, on the stack. */
    void write(String method) {
      if (method.equals("hashCode")) {
        hash();
      } else {
        compare();
      }
    }

    private void get(int local, Handle field) {
      to.visitVarInsn(Opcodes.ALOAD, local);
      to.visitFieldInsn(Opcodes.GETFIELD, name, field.getName(), field.getDesc());
    }

    private void hash() {
      to.visitInsn(Opcodes.POP);
      to.visitInsn(Opcodes.ICONST_0);
      for (Object field : fields) {
        to.visitIntInsn(Opcodes.BIPUSH, 31);
        to.visitInsn(Opcodes.IMUL);
        Handle handle = (Handle) field;
        get(0, handle);
        Type type = Type.getType(handle.getDesc());
        if (type.getSort() < Type.ARRAY) {
          String box = Conversion.box(type);
          to.visitMethodInsn(
              Opcodes.INVOKESTATIC, box, "hashCode", "(" + type.getDescriptor() + ")I", false);
        } else {
          to.visitMethodInsn(
              Opcodes.INVOKESTATIC,
              "java/util/Objects",
              "hashCode",
              "(Ljava/lang/Object;)I",
              false);
        }
        to.visitInsn(Opcodes.IADD);
      }
    }

    private void compare() {
      Label same = new Label();
      Label differs = new Label();
      to.visitInsn(Opcodes.POP2);
      to.visitVarInsn(Opcodes.ALOAD, 1);
      to.visitTypeInsn(Opcodes.INSTANCEOF, name);
      to.visitJumpInsn(Opcodes.IFNE, same);
      to.visitInsn(Opcodes.ICONST_0);
      to.visitInsn(Opcodes.IRETURN);
      to.visitLabel(same);
      to.visitFrame(Opcodes.F_SAME, 0, null, 0, null);
      to.visitVarInsn(Opcodes.ALOAD, 1);
      to.visitTypeInsn(Opcodes.CHECKCAST, name);
      to.visitVarInsn(Opcodes.ASTORE, 2);
      for (Object field : fields) {
        Handle handle = (Handle) field;
        get(0, handle);
        get(2, handle);
        jumpIfOther(Type.getType(handle.getDesc()), differs);
      }
      to.visitInsn(Opcodes.ICONST_1);
      to.visitInsn(Opcodes.IRETURN);
      to.visitLabel(differs);
      to.visitFrame(Opcodes.F_APPEND, 1, new Object[] {name}, 0, null);
      // The method's own return follows.
      to.visitInsn(Opcodes.ICONST_0);
    }

    private void jumpIfOther(Type type, Label differs) {
      String d = type.getDescriptor();
      switch (d) {
        case "Z", "B", "C", "S", "I" -> to.visitJumpInsn(Opcodes.IF_ICMPNE, differs);
        case "J", "F", "D" -> {
          String box = Conversion.box(type);
          to.visitMethodInsn(Opcodes.INVOKESTATIC, box, "compare", "(" + d + d + ")I", false);
          to.visitJumpInsn(Opcodes.IFNE, differs);
        }
        default -> {
          String both = "(Ljava/lang/Object;Ljava/lang/Object;)Z";
          to.visitMethodInsn(Opcodes.INVOKESTATIC, "java/util/Objects", "equals", both, false);
          to.visitJumpInsn(Opcodes.IFEQ, differs);
        }
      }
    }
  }
}
