package nearworld.app.drawing;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class LabelStackTest {
    private static final double RIGHT = 700;
    private static final double SIZE = 11;
    private static final int LEVELS = 5;

    @ParameterizedTest(name = "seed {0}")
    @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
    void noLabelCoversAnotherAndNoLeaderRunsThroughOne(long seed) {
        List<LabelStack.Placed> places = new LabelStack(RIGHT, SIZE, LEVELS).place(wishes(new Random(seed)));
        for (LabelStack.Placed a : places) {
            assertThat(a.to()).as("seed " + seed).isLessThanOrEqualTo(RIGHT);
            for (LabelStack.Placed b : places) {
                if (a != b && a.level() == b.level()) {
                    assertThat(a.from() > b.to() || b.from() > a.to())
                            .as("seed %s: %s, %s", seed, a, b)
                            .isTrue();
                }
                if (a.level() > b.level()) {
                    assertThat(a.x() < b.from() || a.x() > b.to())
                            .as("seed %s: %s, %s", seed, a, b)
                            .isTrue();
                }
            }
        }
    }

    @ParameterizedTest(name = "seed {0}")
    @ValueSource(longs = {11, 12, 13})
    void theNewestAlwaysHasItsLabelOnTheLowestLevel(long seed) {
        List<LabelStack.Wish> wishes = wishes(new Random(seed));
        LabelStack.Placed first =
                new LabelStack(RIGHT, SIZE, LEVELS).place(wishes).get(0);
        double newest = wishes.stream().mapToDouble(LabelStack.Wish::x).max().orElseThrow();
        assertThat(first.x()).as("seed " + seed).isEqualTo(newest);
        assertThat(first.level()).as("seed " + seed).isZero();
    }

    private static List<LabelStack.Wish> wishes(Random random) {
        List<LabelStack.Wish> wishes = new ArrayList<>();
        for (int i = 0; i < 30; i++) {
            wishes.add(new LabelStack.Wish(
                    random.nextDouble() * RIGHT, "intensive care, " + (1 + random.nextInt(28)) + " May 2024"));
        }
        return wishes;
    }
}
