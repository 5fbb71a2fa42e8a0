package nearworld.app.database;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.OverlappingFileLockException;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/**
 * Keeps two servers off one data folder. The operating system drops it when the process ends, however it ends, so a
 * database left running by a process without the lock is an orphan.
 */
final class FolderLock {
    private static final Logger LOG = LoggerFactory.getLogger(FolderLock.class);

    private final FileChannel channel;

    private FolderLock(FileChannel channel) {
        this.channel = channel;
    }

    static FolderLock acquire(Path folder) throws IOException {
        FileChannel channel =
                FileChannel.open(folder.resolve("nearworld.lock"), StandardOpenOption.CREATE, StandardOpenOption.WRITE);
        if (tryLock(channel) == null) {
            channel.close();
            throw new DatabaseRefusedException("Another Nearworld is running on the data folder " + folder
                    + "; stop it, or set NEARWORLD_DATA to another folder.");
        }
        return new FolderLock(channel);
    }

    private static @Nullable FileLock tryLock(FileChannel channel) throws IOException {
        try {
            return channel.tryLock();
        } catch (OverlappingFileLockException e) {
            // Held by this very process.
            return null;
        }
    }

    void release() {
        try {
            channel.close();
        } catch (IOException e) {
            LOG.warn("The lock of the data folder was not released; the end of the process releases it", e);
        }
    }
}
