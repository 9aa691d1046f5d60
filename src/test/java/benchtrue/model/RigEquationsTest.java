package benchtrue.model;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** The equations of eight invented rigs: which unknowns they have, in which units, and the rows that they make. */
class RigEquationsTest {
    private static Unit unit(String text) {
        return Unit.parse(text).get();
    }

    private static Scope channels(String... namesAndUnits) {
        Scope scope = Scope.EMPTY;
        for (int i = 0; i < namesAndUnits.length; i += 2) {
            scope = scope.withChannel(namesAndUnits[i], unit(namesAndUnits[i + 1]), Double.NaN);
        }
        return scope;
    }

    private static Regressor row(Relation relation, double... values) {
        Observation observation = new Observation(values.length);
        System.arraycopy(values, 0, observation.values, 0, values.length);
        Regressor regressor = relation.compile();
        assertThat(regressor.evaluate(observation)).isTrue();
        return regressor;
    }

    private static List<String> unknowns(Relation relation) {
        return relation.unknowns().stream()
                .map(u -> u.name() + " [" + u.unit() + "]" + (u.constantTerm() ? " constant" : ""))
                .toList();
    }

    @Test
    void gearPumpSlipConvertsByItselfWithOneFactor() {
        Scope scope = channels("n", "rev/min", "dp", "bar", "Q", "L/min");
        Relation relation = Relation.parse("Q = D*n + c*dp + q0", scope, Map.of("D", unit("cm^3/rev")), null)
                .get();
        assertThat(unknowns(relation)).containsExactly("D [cm^3/rev]", "c [L/(min*bar)]", "q0 [L/min] constant");
        Regressor row = row(relation, 1800, 120, 17.3);
        assertThat(row.response()).isEqualTo(17.3);
        assertThat(row.regressors()).containsExactly(1800 * 0.001, 120, 1);
        assertThat(row.weight()).isEqualTo(1);
    }

    @Test
    void undeclaredGainTakesTheUnitThatMakesItFit() {
        Scope scope = channels("n", "rev/min", "Q", "L/min");
        Relation relation = Relation.parse("Q = D*n", scope, Map.of(), null).get();
        assertThat(unknowns(relation)).containsExactly("D [L/rev]");
        assertThat(row(relation, 1800, 17).regressors()).containsExactly(1800);
    }

    @Test
    void thermoelectricStage() {
        Scope scope = channels("dT", "K", "I", "A", "V", "V");
        Map<String, Unit> declared = Map.of("S", unit("V/K"), "R", unit("ohm"));
        Relation relation =
                Relation.parse("V = S*dT + R*I + V0", scope, declared, null).get();
        assertThat(unknowns(relation)).containsExactly("S [V/K]", "R [ohm]", "V0 [V] constant");
        assertThat(row(relation, 20, 1.5, 3.9).regressors()).containsExactly(20, 1.5, 1);
    }

    @Test
    void dosingVessel() {
        Scope scope = channels("m", "kg", "cA", "mV/V", "cB", "mV/V", "cC", "mV/V");
        Relation relation = Relation.parse("m = kA*cA + kB*cB + kC*cC + m0", scope, Map.of(), null)
                .get();
        assertThat(unknowns(relation))
                .containsExactly("kA [kg*V/mV]", "kB [kg*V/mV]", "kC [kg*V/mV]", "m0 [kg] constant");
        assertThat(row(relation, 100, 0.41, 0.42, 0.43).regressors()).containsExactly(0.41, 0.42, 0.43, 1);
    }

    @Test
    void pressureTransmitterWithDirection() {
        Scope scope = channels("p", "bar", "I", "mA");
        Relation relation =
                Relation.parse("I = z + s*p + h*dir(p)", scope, Map.of(), null).get();
        assertThat(unknowns(relation)).containsExactly("z [mA] constant", "s [mA/bar]", "h [mA]");
    }

    @Test
    void electrolyserCell() {
        Scope scope = channels("I", "A", "V", "V").withConstant("I0", 1, unit("A"));
        Relation relation = Relation.parse("V = E + b*ln(I/I0) + r*I", scope, Map.of("r", unit("mohm")), null)
                .get();
        assertThat(unknowns(relation)).containsExactly("E [V] constant", "b [V]", "r [mohm]");
        assertThat(row(relation, 10, 1.6).regressors()).containsExactly(1, Math.log(10), 10 * 0.001);
    }

    @Test
    void valveStem() {
        Scope scope = channels("x", "mm", "F", "N");
        Relation relation = Relation.parse("F = k*x + F_c*dir(x) + F0", scope, Map.of("k", unit("N/mm")), null)
                .get();
        assertThat(unknowns(relation)).containsExactly("k [N/mm]", "F_c [N]", "F0 [N] constant");
    }

    @Test
    void cyclone() {
        Scope scope = channels("q", "100 m^3/h", "dp", "Pa");
        Relation relation =
                Relation.parse("dp = A*q^2 + B*q + c", scope, Map.of(), null).get();
        assertThat(relation.unknowns()).extracting(Relation.Unknown::name).containsExactly("A", "B", "c");
        assertThat(row(relation, 3, 300).regressors()).containsExactly(9, 3, 1);
    }

    @Test
    void selfHeatingOfAThermometerWithADerivedPower() {
        Scope scope = channels("I", "mA", "R", "ohm").withConstant("R0", 111.5, unit("ohm"));
        Expression power = Expression.parse("I^2*R0", scope).get();
        scope = scope.withDerived("P", power);
        Map<String, Unit> declared = new LinkedHashMap<>();
        declared.put("h", unit("ohm/mW"));
        Relation relation =
                Relation.parse("R = R_z + h*P", scope, declared, null).get();
        assertThat(unknowns(relation)).containsExactly("R_z [ohm] constant", "h [ohm/mW]");
        double microwatts = 2 * 2 * 111.5;
        assertThat(row(relation, 2, 111.6, microwatts).regressors()).containsExactly(1, microwatts * 0.001);
    }
}
