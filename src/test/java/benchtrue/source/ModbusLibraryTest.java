package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.digitalpetri.modbus.client.ModbusRtuClient;
import com.digitalpetri.modbus.exceptions.ModbusResponseException;
import com.digitalpetri.modbus.pdu.ReadHoldingRegistersRequest;
import com.digitalpetri.modbus.pdu.ReadInputRegistersRequest;
import com.digitalpetri.modbus.pdu.WriteSingleRegisterRequest;
import com.digitalpetri.modbus.serial.client.SerialPortClientTransport;
import com.digitalpetri.modbus.serial.server.SerialPortServerTransport;
import com.digitalpetri.modbus.server.ModbusRtuServer;
import com.digitalpetri.modbus.server.ProcessImage;
import com.digitalpetri.modbus.server.ReadOnlyModbusServices;
import com.fazecast.jSerialComm.SerialPort;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CompletionException;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/** Our two ends of a Modbus line, each against the other end of a general-purpose library (com.digitalpetri.modbus). */
@Tag("end-to-end")
@Timeout(60)
class ModbusLibraryTest {
    private static final int ROUNDS = 200;

    @TempDir
    Path folder;

    private final PolledRig rig = new PolledRig(PolledRig.MODBUS);

    private static ModbusRtuServer server(String port, Map<Integer, ProcessImage> units) {
        return ModbusRtuServer.create(
                SerialPortServerTransport.create(config -> {
                    config.serialPort = port;
                    config.baudRate = 19_200;
                    config.dataBits = 8;
                    config.parity = SerialPort.EVEN_PARITY;
                    config.stopBits = SerialPort.ONE_STOP_BIT;
                }),
                new ReadOnlyModbusServices() {
                    @Override
                    protected Optional<ProcessImage> getProcessImage(int unit) {
                        return Optional.ofNullable(units.get(unit));
                    }
                });
    }

    @Test
    void twoInstrumentsOfALibrarysServerAreRead() throws Exception {
        ProcessImage one = new ProcessImage();
        ProcessImage seventeen = new ProcessImage();
        one.with(t -> t.writeHoldingRegisters(r -> r.put(107, new byte[] {(byte) 0xFF, 0x38}))); // -200
        byte[] bytes = ByteBuffer.allocate(4).putFloat(-273.15f).array();
        seventeen.with(t -> t.writeInputRegisters(r -> {
            r.put(8, new byte[] {bytes[2], bytes[3]});
            r.put(9, new byte[] {bytes[0], bytes[1]});
        }));
        try (TerminalPair pair = new TerminalPair(folder)) {
            ModbusRtuServer server = server(pair.far(), Map.of(1, one, 17, seventeen));
            server.start();
            try (PortLink link = PortLink.open(pair.near(), rig.line())) {
                PolledLine line = rig.over(link);
                for (int round = 0; round < ROUNDS; round++) {
                    Polled polled = line.next();
                    assertThat(polled.problems()).isEmpty();
                    assertThat(polled.values()).containsExactly(-2.0, -273.15f);
                }
            } finally {
                server.stop();
            }
        }
    }

    @Test
    void aBlockOfALibrarysServerIsReadAtOnce() throws Exception {
        PolledRig block = new PolledRig(PolledRig.BLOCK);
        ProcessImage one = new ProcessImage();
        byte[] bytes = ByteBuffer.allocate(4).putFloat(1.5f).array();
        one.with(t -> t.writeHoldingRegisters(r -> {
            r.put(107, new byte[] {0, 42});
            r.put(108, new byte[] {bytes[0], bytes[1]});
            r.put(109, new byte[] {bytes[2], bytes[3]});
        }));
        try (TerminalPair pair = new TerminalPair(folder)) {
            ModbusRtuServer server = server(pair.far(), Map.of(1, one));
            server.start();
            try (PortLink link = PortLink.open(pair.near(), block.line())) {
                Polled polled = block.over(link).next();
                assertThat(polled.problems()).isEmpty();
                assertThat(polled.values()).containsExactly(0.42, 1.5);
                assertThat(polled.stamps()[0]).isEqualTo(polled.stamps()[1]);
            } finally {
                server.stop();
            }
        }
    }

    @Test
    void aLibrarysClientReadsTheSimulatedRigAndCannotWriteToIt() throws Exception {
        try (TerminalPair pair = new TerminalPair(folder)) {
            CompletableFuture<Long> answers = rig.answering(pair.far(), 1, CableFaults.NONE);
            ModbusRtuClient client = ModbusRtuClient.create(
                    SerialPortClientTransport.create(config -> {
                        config.serialPort = pair.near();
                        config.baudRate = 19_200;
                        config.parity = SerialPort.EVEN_PARITY;
                    }),
                    config -> config.requestTimeout = Duration.ofSeconds(2));
            client.connect();
            try {
                byte[] current = client.readHoldingRegisters(1, new ReadHoldingRegistersRequest(107, 1))
                        .registers();
                assertThat(ByteBuffer.wrap(current).getShort() * 0.01).isBetween(0.0, 20.0);
                byte[] voltage = client.readInputRegisters(17, new ReadInputRegistersRequest(8, 2))
                        .registers();
                float volts = ByteBuffer.wrap(new byte[] {voltage[2], voltage[3], voltage[0], voltage[1]})
                        .getFloat();
                assertThat(volts).isBetween(0f, 40f);
                // Which exception it is cannot be checked here: the library reads its code from the byte before.
                assertThatThrownBy(() -> client.readHoldingRegisters(1, new ReadHoldingRegistersRequest(106, 1)))
                        .isInstanceOf(ModbusResponseException.class);
                assertThatThrownBy(() -> client.writeSingleRegister(1, new WriteSingleRegisterRequest(107, 5)))
                        .isInstanceOf(ModbusResponseException.class);
            } finally {
                client.disconnect();
            }
            pair.pull();
            assertThatThrownBy(answers::join).isInstanceOf(CompletionException.class);
        }
    }
}
