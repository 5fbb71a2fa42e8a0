package nearworld.exchange.tables;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import nearworld.engine.basics.Sex;
import nearworld.engine.mortality.MortalityTable;
import nearworld.exchange.faults.LocatedFault;
import nearworld.exchange.faults.Reading;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Every kind of bad table, and what good ones hold. */
class TableFaultsTest {
    private static Reading<Table> reading(String text) {
        return TableReader.read(text.getBytes(StandardCharsets.UTF_8));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "#name: T/sex,age,qx/male,40,-0.1|belowMinimum|$.qx|3",
                "#name: T/sex,age,qx/male,40,1.5|aboveMaximum|$.qx|3",
                "#name: T/sex,age,qx/male,40,NaN|notANumber|$.qx|3",
                "#name: T/sex,age,qx/male,40,Infinity|notANumber|$.qx|3",
                "#name: T/sex,age,qx/male,40,|notANumber|$.qx|3",
                "#name: T/sex,age,qx/male,40,0x1p-3|notANumber|$.qx|3",
                "#name: T/sex,age,qx/male,40,0.1/male,42,0.1|ageGap|$.age|4",
                "#name: T/sex,age,qx/male,40,0.1/male,40,0.1|duplicateRow|$.age|4",
                "#name: T/sex,age,qx/male,40,1/male,41,0.5|certainDeathBeforeEnd|$.qx|3",
                "#name: T/sex,age,qx/male,40.5,0.1|ageNotWhole|$.age|3",
                "#name: T/sex,age,qx/male,120,0.1|ageNotWhole|$.age|3",
                "#name: T/sex,age,qx/male,-1,0.1|ageNotWhole|$.age|3",
                "#name: T/sex,age,qx/man,40,0.1|notAllowed|$.sex|3",
                "#name: T/sex,age,qx/male,40|cellCount|$|3",
                "#name: T/sex,age,qx/male,40,0.1,7|cellCount|$|3",
                "#name: T/sex,age,rate/male,40,0.1|missingColumn|$|2",
                "#name: T/sex,age,qx,colour/male,40,0.1,red|unknownColumn|$|2",
                "#name: T/sex,age,qx,duration/male,40,0.1,1|notSupported|$.duration|3",
                "#name: T/sex,age,qx,smoking/male,40,0.1,smoker|smokingClassUnmapped|$.smoking|3",
                "#name: T/#ageBasis: next/sex,age,qx/male,40,0.1|notAllowed|$.ageBasis|2",
                "#name: T/#withinYear: linear/sex,age,qx/male,40,0.1|notAllowed|$.withinYear|2",
                "#name: T/#colour: red/sex,age,qx/male,40,0.1|unknownField|$.colour|2",
                "#name: T/#name: U/sex,age,qx/male,40,0.1|duplicateKey|$.name|2",
                "#source: T/sex,age,qx/male,40,0.1|missingField|$.name|1",
                "#name T/sex,age,qx/male,40,0.1|headLine|$|1",
                "#name: T/sex,age,qx|noRates|$|1",
                "#name: T|noColumns|$|2",
            })
    void refusesOneWrongThing(String lines, String code, String path, int line) {
        List<LocatedFault> faults = reading(lines.replace("/", "\n") + "\n").located();

        assertThat(faults).anySatisfy(f -> {
            assertThat(f.fault().code()).isEqualTo(code);
            assertThat(f.fault().path()).isEqualTo(path);
            assertThat(f.place().line()).isEqualTo(line);
        });
    }

    @Test
    void refusesHugeFilesAndJunk() {
        assertThat(TableReader.read(new byte[50 * 1024 * 1024]).faults().get(0).code())
                .isEqualTo("tooLarge");
        assertThat(TableReader.read(new byte[] {'P', 'K', 3, 4, (byte) 0xC3, 0x28})
                        .faults()
                        .get(0)
                        .code())
                .isEqualTo("notUtf8");
        assertThat(reading("").faults()).isNotEmpty();
    }

    @Test
    void readsHeadSmokingClassesWindowsLineEndsAndAByteOrderMark() {
        MortalityTable table = reading(
                        "\uFEFF#name: Split\r\n#ageBasis: last\r\n#withinYear: balducci\r\n#population: insured\r\n"
                                + "#smokingLevels: nonsmoker=never,former; smoker=current\r\n"
                                + "sex,age,qx,smoking\r\nfemale,40,0.001,nonsmoker\r\nfemale,41,1,nonsmoker\r\nfemale,40,2e-3,smoker\r\n")
                .value()
                .rates();

        assertThat(table.name()).isEqualTo("Split");
        assertThat(table.ageBasis()).isEqualTo(MortalityTable.AgeBasis.LAST);
        assertThat(table.withinYear()).isEqualTo(MortalityTable.WithinYear.BALDUCCI);
        assertThat(table.population()).isEqualTo("insured");
        assertThat(table.column(Sex.FEMALE, "former").qx()).containsExactly(0.001, 1.0);
        assertThat(table.column(Sex.FEMALE, "current").qx()).containsExactly(0.002);
        assertThat(table.column(Sex.MALE, "current")).isNull();
    }

    @Test
    void readsTheShippedTableAndThoseOfOtherSources() throws IOException {
        assertThat(reading(Files.readString(Path.of("seed-data/tables/us-2014-population.csv")))
                        .located())
                .isEmpty();
        assertThat(reading(Files.readString(Path.of("src/test/resources/oracles/worked/table.csv")))
                        .located())
                .isEmpty();
    }
}
