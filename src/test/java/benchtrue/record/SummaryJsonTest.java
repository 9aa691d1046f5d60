package benchtrue.record;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.run.Closing;
import java.util.List;
import org.junit.jupiter.api.Test;

final class SummaryJsonTest {
    private final String json = SummaryJson.of(Closings.pump());

    @Test
    void carriesTheFieldsThatScriptsReadInTheirOrder() {
        assertThat(json)
                .startsWith("{\n  \"program\": {\n    \"name\": \"benchtrue\",\n    \"version\": \"")
                .containsSubsequence(
                        "\"sheet\": {", "\"title\": \"Gear-pump slip, stand 2\"", "\"item\": \"pump 0417\"")
                .containsSubsequence(
                        "\"source\": {", "\"kind\": \"replay\"", "\"startedUtc\": \"2026-03-01T08:00:00Z\"")
                .containsSubsequence("\"readings\": {", "\"seen\": 3000", "\"heldOut\": 7", "\"seconds\": 599.8")
                .containsSubsequence("\"forgetting\": {", "\"kind\": \"exponential\"", "\"memory\": \"120 s\"")
                .containsSubsequence("\"verdict\": null", "\"verdictWithheld\": \"a drift alarm stands\"")
                .containsSubsequence("\"batch\": {", "\"agrees\": true")
                .containsSubsequence("\"constancy\": {", "\"pValue\": 0.55")
                .containsSubsequence("\"segments\": [", "\"reason\": \"step of c\"")
                .containsSubsequence("\"kind\": \"step\"", "\"cause\": \"not separable\"", "\"priority\": \"act now\"")
                .endsWith("\"status\": 3,\n  \"statusText\": \"the run found something: a drift alarm\"\n}\n");
    }

    @Test
    void whatIsNotKnownOrInfiniteIsNull() {
        assertThat(json)
                .contains("\"factor\": null")
                .contains("\"wanted\": null")
                .contains("\"degreesOfFreedom\": null");
        assertThat(json).containsPattern("\"limits\": \\[\\s*16\\.0,\\s*null\\s*\\]");
        assertThat(json).doesNotContain("NaN").doesNotContain("Infinity");
    }

    @Test
    void severalRunsAreAnArrayInTheirOrder() {
        Closing closing = Closings.pump();
        String array = SummaryJson.of(List.of(closing, closing));
        assertThat(array).startsWith("[\n").endsWith("]\n");
        assertThat(array.split("\"program\"", -1)).hasSize(3);
    }

    @Test
    void isTheSameEachTime() {
        assertThat(SummaryJson.of(Closings.pump())).isEqualTo(json);
    }
}
