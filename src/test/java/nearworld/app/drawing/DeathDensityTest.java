package nearworld.app.drawing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class DeathDensityTest {
    /** Deaths spread evenly over 40 years (de Moivre's law, 1725): the density is 1/40 a year throughout. */
    @Test
    void isFlatWhereDeathsAreSpreadEvenly() {
        List<Double> monthly =
                IntStream.rangeClosed(0, 480).mapToObj(m -> 1 - m / 480.0).toList();
        DeathDensity density = new DeathDensity(monthly);
        for (int i = 0; i < density.size(); i++) {
            assertThat(density.at(i)).isCloseTo(1 / 40.0, offset(1e-12));
        }
        assertThat(density.peak()).isCloseTo(1 / 40.0, offset(1e-12));
    }
}
