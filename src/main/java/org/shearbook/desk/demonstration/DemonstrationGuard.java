package org.shearbook.desk.demonstration;

import jakarta.servlet.FilterChain;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.net.InetAddress;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.context.annotation.Profile;
import org.springframework.core.Ordered;
import org.springframework.core.annotation.Order;
import org.springframework.stereotype.Component;
import org.springframework.web.filter.OncePerRequestFilter;

/**
 * The demonstration's passwords are known to everybody, so it is served to this machine alone: it does not start on
 * another address, and a request from elsewhere, through a forwarder for example, is refused.
 */
@Component
@Profile("demo")
@Order(Ordered.HIGHEST_PRECEDENCE)
class DemonstrationGuard extends OncePerRequestFilter {

    DemonstrationGuard(@Value("${server.address:}") String serverAddress) throws IOException {
        if (serverAddress.isBlank() || !InetAddress.getByName(serverAddress).isLoopbackAddress()) {
            throw new IllegalStateException("The demonstration has accounts whose passwords everybody knows, so it starts on a loopback address only. "
                    + "Set server.address=127.0.0.1, or leave out the profile demo.");
        }
    }

    @Override
    protected void doFilterInternal(HttpServletRequest request, HttpServletResponse response, FilterChain chain) throws ServletException, IOException {
        if (InetAddress.getByName(request.getRemoteAddr()).isLoopbackAddress()) {
            chain.doFilter(request, response);
        } else {
            response.sendError(HttpServletResponse.SC_FORBIDDEN);
        }
    }
}
