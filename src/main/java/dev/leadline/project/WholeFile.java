package dev.leadline.project;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.nio.file.attribute.PosixFileAttributeView;
import java.util.HexFormat;
import java.util.Objects;
import java.util.concurrent.ThreadLocalRandom;

/// Writes a file as a whole or not at all: beside the old one, through to the disk, then in its place.
public final class WholeFile {

    private WholeFile() {}

    /// Follows links, and keeps the permissions of a file that is there.
    ///
    /// @throws Refusal where the file or its folder cannot be written; the old file is then untouched
    public static void write(Path file, byte[] bytes) {
        Path target = target(file);
        try {
            replace(target, bytes);
        } catch (IOException e) {
            throw refusal(file, e);
        }
    }

    /// Before something is computed that is to be written there.
    ///
    /// @throws Refusal where that is a folder, or write-protected, or in no folder
    public static void check(Path file) {
        target(file);
    }

    private static Path target(Path file) {
        try {
            Path target = Files.exists(file) ? file.toRealPath() : file.toAbsolutePath();
            if (Files.isDirectory(target)) {
                throw refusal(file, "It is a folder.");
            }
            if (Files.exists(target) && !Files.isWritable(target)) {
                throw refusal(file, "It is write-protected.");
            }
            Path folder = target.getParent();
            if (!Files.isDirectory(folder)) {
                throw refusal(file, "There is no folder %s.".formatted(Shown.plain(folder.toString())));
            }
            return target;
        } catch (IOException e) {
            throw refusal(file, e);
        }
    }

    private static void replace(Path target, byte[] bytes) throws IOException {
        String mark = HexFormat.of().toHexDigits(ThreadLocalRandom.current().nextInt());
        Path fresh = target.resolveSibling("." + target.getFileName() + "." + mark + ".part");
        try {
            try (var channel = FileChannel.open(fresh, StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE)) {
                for (var rest = ByteBuffer.wrap(bytes); rest.hasRemaining(); ) {
                    channel.write(rest);
                }
                channel.force(true);
            }
            keepPermissions(target, fresh);
            Files.move(fresh, target, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
        } finally {
            Files.deleteIfExists(fresh);
        }
        forceFolder(target.getParent());
    }

    private static void keepPermissions(Path old, Path fresh) throws IOException {
        var from = Files.getFileAttributeView(old, PosixFileAttributeView.class);
        if (from != null && Files.exists(old)) {
            Files.setPosixFilePermissions(fresh, from.readAttributes().permissions());
        }
    }

    /// The new name reaches the disk with the folder; where a system cannot do that, the file itself is safe already.
    private static void forceFolder(Path folder) {
        try (var channel = FileChannel.open(folder, StandardOpenOption.READ)) {
            channel.force(true);
        } catch (IOException e) {
            System.getLogger(WholeFile.class.getName()).log(System.Logger.Level.DEBUG, "folder not forced", e);
        }
    }

    private static Refusal refusal(Path file, IOException e) {
        String why = e instanceof FileSystemException denied
                ? Objects.requireNonNullElse(denied.getReason(), "The folder cannot be written.")
                : String.valueOf(e.getMessage());
        return refusal(file, Shown.plain(why));
    }

    private static Refusal refusal(Path file, String why) {
        return new Refusal(Problem.of("%s cannot be written".formatted(Shown.plain(file.toString())))
                .because(why)
                .tryThis("Choose another place; nothing there was changed."));
    }
}
