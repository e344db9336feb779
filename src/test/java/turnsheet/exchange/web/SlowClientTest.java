package turnsheet.exchange.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.zaxxer.hikari.HikariDataSource;
import jakarta.servlet.http.HttpServlet;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.net.InetAddress;
import java.net.InetSocketAddress;
import java.net.Socket;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.apache.catalina.startup.Tomcat;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.mock.web.MockHttpServletResponse;
import turnsheet.capture.IncomingFolder;
import turnsheet.exchange.Export;
import turnsheet.exchange.ExportOn;
import turnsheet.exchange.Scope;
import turnsheet.exchange.Spool;
import turnsheet.testing.Database;
import turnsheet.web.RefusedRequestException;

/** Who reads slowly, on real sockets, with one connection to the database for everybody. */
class SlowClientTest {

  /** Texts of 4000 characters: far more than the sockets of both sides take in (some 6 MB). */
  private static final int UNITS = 2500;

  @TempDir Path data;

  @Test
  void clientsThatStopReadingHoldNoConnectionAndLeaveNoFile() throws Exception {
    try (HikariDataSource pool = new HikariDataSource()) {
      pool.setJdbcUrl(Database.H2.dataSource().unwrap(HikariDataSource.class).getJdbcUrl());
      pool.setUsername(Database.H2.user());
      pool.setPassword("");
      pool.setMaximumPoolSize(1);
      pool.setConnectionTimeout(5000);
      JdbcClient jdbc = JdbcClient.create(pool);
      fill(jdbc);
      Tomcat server = server(pool);
      try {
        List<Socket> stuck = new ArrayList<>();
        for (int i = 0; i < 3; i++) {
          stuck.add(ask(server));
        }
        for (Socket one : stuck) {
          assertThat(head(one)).contains("HTTP/1.1 200").containsPattern("Content-Length: 1\\d{7}");
        }
        assertThat(parts()).as("still being sent").hasSize(3);
        assertThat(pool.getHikariPoolMXBean().getActiveConnections()).isZero();
        assertThat(jdbc.sql("select count(*) from unit").query(Integer.class).single())
            .isEqualTo(UNITS);
        for (Socket one : stuck) {
          one.close();
        }
        // each notices when it writes next
        for (int i = 0; i < 200 && !parts().isEmpty(); i++) {
          Thread.sleep(20);
        }
        assertThat(parts()).isEmpty();
      } finally {
        server.stop();
        server.destroy();
      }
    } finally {
      Database.H2.empty();
    }
  }

  @Test
  void aFullDiskIsSaidAndNothingIsSent() throws IOException {
    Export export = ExportOn.database(Database.H2.dataSource());
    ExportFiles files =
        new ExportFiles(export, ExportOn.fullDisk(new IncomingFolder(data, Clock.systemUTC())));
    MockHttpServletResponse response = new MockHttpServletResponse();
    assertThatThrownBy(() -> files.json(Scope.everything(), response))
        .isInstanceOf(RefusedRequestException.class)
        .hasMessageContaining("no room for this export");
    assertThat(response.isCommitted()).isFalse();
    assertThat(parts()).isEmpty();
  }

  private Tomcat server(HikariDataSource pool) throws Exception {
    ExportFiles files =
        new ExportFiles(
            ExportOn.database(pool), new Spool(new IncomingFolder(data, Clock.systemUTC())));
    Tomcat server = new Tomcat();
    server.setBaseDir(data.resolve("server").toString());
    server.setPort(0);
    server.getConnector().setProperty("address", "127.0.0.1");
    var context = server.addContext("", null);
    Tomcat.addServlet(
        context,
        "export",
        new HttpServlet() {
          @Override
          protected void doGet(HttpServletRequest request, HttpServletResponse response)
              throws IOException {
            files.json(Scope.everything(), response);
          }
        });
    context.addServletMapping("/", "export");
    server.start();
    return server;
  }

  private static Socket ask(Tomcat server) throws IOException {
    Socket socket = new Socket();
    socket.setReceiveBufferSize(4096);
    socket.setSoTimeout(20_000);
    socket.connect(
        new InetSocketAddress(
            InetAddress.getLoopbackAddress(), server.getConnector().getLocalPort()));
    socket
        .getOutputStream()
        .write("GET / HTTP/1.1\r\nHost: localhost\r\n\r\n".getBytes(StandardCharsets.US_ASCII));
    return socket;
  }

  /** Reads the head and then stops. */
  private static String head(Socket socket) throws IOException {
    BufferedReader in =
        new BufferedReader(
            new InputStreamReader(socket.getInputStream(), StandardCharsets.US_ASCII));
    StringBuilder head = new StringBuilder();
    for (String line = in.readLine(); line != null && !line.isEmpty(); line = in.readLine()) {
      head.append(line).append('\n');
    }
    return head.toString();
  }

  private List<Path> parts() throws IOException {
    try (Stream<Path> files = Files.list(data.resolve("incoming"))) {
      return files.toList();
    }
  }

  private static void fill(JdbcClient jdbc) {
    Database.H2.empty();
    jdbc.sql("insert into machine_model values (random_uuid(), 'Model', null, '')").update();
    jdbc.sql("insert into customer values (random_uuid(), 'Customer', '', now())").update();
    jdbc.sql(
            """
            insert into unit (id, code, model_id, customer_id, serial_number, note, created_at)
            select random_uuid(), cast("X" as varchar), m.id, c.id, cast("X" as varchar),
              repeat('n', 4000), now()
            from system_range(1, ?), machine_model m, customer c
            """)
        .param(UNITS)
        .update();
  }
}
