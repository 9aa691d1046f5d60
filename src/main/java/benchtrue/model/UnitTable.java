package benchtrue.model;

import java.math.BigDecimal;
import java.util.Collection;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.TreeSet;
import org.jspecify.annotations.Nullable;

/**
 * The units that have a name. SI units, their prefixes and the units used with them: SI Brochure, 9th ed. (2019, prefixes of
 * 2022), tables 3 to 8. The others by their exact definitions, NIST SP 811 (2008), appendix B, from memory: lb 0.45359237 kg,
 * in 25.4 mm, standard gravity 9.80665 m/s², mmHg 133.322387415 Pa and mmH2O 9.80665 Pa (conventional), cal 4.184 J
 * (thermochemical), Btu 1055.05585262 J (International Table), gal 231 in³ (US liquid), hp 550 ft·lbf/s.
 *
 * <p>A name that stands here goes before the same letters read as prefix and unit: {@code min} is the minute, {@code cd} the
 * candela, {@code Pa} the pascal, {@code ft} the foot, {@code h} the hour.
 */
final class UnitTable {
    private static final Map<String, Unit> NAMED = new LinkedHashMap<>();
    private static final Map<String, Unit> PREFIXED = new LinkedHashMap<>();
    private static final Map<String, Integer> PREFIXES = new LinkedHashMap<>();

    /** In the order of their use: names (a {@code +} before them: with SI prefixes) = definition. */
    private static final String DEFINITIONS = """
            + g = 0.001 kg
            + Hz = 1/s
            + N = kg*m/s^2
            + Pa = N/m^2
            + J = N*m
            + W = J/s
            + C = A*s
            + V = W/A
            + F = C/V
            + ohm Ohm Ω \u2126 = V/A
            + S = A/V
            + Wb = V*s
            + T = Wb/m^2
            + H = Wb/A
            + sr = rad^2
            + lm = cd*sr
            + lx = lm/m^2
            + Bq = 1/s
            + Gy Sv = J/kg
            + kat = mol/s
            + VA = V*A
            min = 60 s
            h = 60 min
            d = 24 h
            deg ° = π*rad/180
            rpm = rev/min
            + L l = 0.001 m^3
            + t = 1000 kg
            + bar = 100000 Pa
            + Wh = W*h
            + Ah = A*h
            + eV = 1.602176634e-19 J
            % = 0.01
            ‰ = 0.001
            ppm = 1e-6
            ppb = 1e-9
            in = 25.4 mm
            ft = 12 in
            yd = 3 ft
            mi = 1760 yd
            lb = 0.45359237 kg
            oz = lb/16
            kgf = 9.80665 kg*m/s^2
            gf = 0.001 kgf
            lbf = 9.80665 lb*m/s^2
            ozf = lbf/16
            psi = lbf/in^2
            atm = 101325 Pa
            Torr = atm/760
            mmHg = 133.322387415 Pa
            inHg = 25.4 mmHg
            mmH2O = 9.80665 Pa
            inH2O = 25.4 mmH2O
            hp = 550 ft*lbf/s
            + cal = 4.184 J
            Btu = 1055.05585262 J
            gal = 231 in^3
            degR = 5*K/9
            """;

    static {
        String[] prefixes = {
            "da 1", "d -1", "c -2", "m -3", "u -6", "µ -6", "μ -6", "n -9", "p -12", "f -15", "a -18", "z -21", "y -24",
            "r -27", "q -30", "h 2", "k 3", "M 6", "G 9", "T 12", "P 15", "E 18", "Z 21", "Y 24", "R 27", "Q 30"
        };
        for (String prefix : prefixes) {
            String[] parts = prefix.split(" ");
            PREFIXES.put(parts[0], Integer.valueOf(parts[1]));
        }
        for (String base : new String[] {"m", "s", "A", "K", "mol", "cd", "rad"}) {
            PREFIXED.put(base, Unit.base(base));
        }
        NAMED.put("kg", Unit.base("kg"));
        NAMED.put("rev", Unit.base("rev"));
        NAMED.put("π", Unit.number("π", Powers.of(Scale.PI)));
        DEFINITIONS.lines().forEach(UnitTable::define);
        NAMED.remove("π");
        temperature("degC °C ℃", "K", "273.15");
        temperature("degF °F ℉", "degR", "459.67");
    }

    private UnitTable() {}

    private static void define(String line) {
        String[] sides = line.split(" = ");
        boolean prefixed = sides[0].startsWith("+ ");
        Unit unit = Unit.parse(sides[1]).get();
        for (String name : sides[0].replace("+ ", "").split(" ")) {
            (prefixed ? PREFIXED : NAMED).put(name, unit.named(name));
        }
    }

    private static void temperature(String names, String degree, String offset) {
        for (String name : names.split(" ")) {
            NAMED.put(name, Unit.parse(degree).get().shifted(name, new BigDecimal(offset)));
        }
    }

    /** The unit of that name, with a prefix or without; null where there is none. */
    static @Nullable Unit find(String name) {
        Unit exact = NAMED.getOrDefault(name, PREFIXED.get(name));
        return exact != null ? exact : prefixed(name);
    }

    private static @Nullable Unit prefixed(String name) {
        for (Map.Entry<String, Integer> prefix : PREFIXES.entrySet()) {
            Unit unit = name.startsWith(prefix.getKey())
                    ? PREFIXED.get(name.substring(prefix.getKey().length()))
                    : null;
            if (unit != null) {
                Unit power = Unit.number("", Scale.tenTo(prefix.getValue()));
                return power.times(unit).named(name);
            }
        }
        return null;
    }

    /** Every name, with the prefixes that benches use: what a misspelt one may have meant. */
    static Collection<String> names() {
        return Names.ALL;
    }

    /** Apart, so that it is made only when somebody misspells a unit. */
    private static final class Names {
        static final Collection<String> ALL = new TreeSet<>();

        static {
            ALL.addAll(NAMED.keySet());
            ALL.addAll(PREFIXED.keySet());
            for (String prefix : new String[] {"m", "u", "k", "M", "c"}) {
                PREFIXED.keySet().forEach(name -> ALL.add(prefix + name));
            }
        }
    }

    /** What a name means that is no unit but that benches write for one; null where nothing is known. */
    static @Nullable String meant(String name) {
        return MEANT.get(name);
    }

    private static final Map<String, String> MEANT = new HashMap<>(Map.of(
            "Nm", "N*m", "kNm", "kN*m", "sec", "s", "kph", "km/h", "kmh", "km/h", "lpm", "L/min", "cc", "cm^3", "gpm",
            "gal/min", "kp", "kgf", "U", "rev"));
}
