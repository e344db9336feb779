package turnsheet.access.web;

import jakarta.servlet.DispatcherType;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.core.annotation.Order;
import org.springframework.http.HttpHeaders;
import org.springframework.http.HttpStatus;
import org.springframework.security.config.annotation.web.builders.HttpSecurity;
import org.springframework.security.config.annotation.web.configurers.ExceptionHandlingConfigurer;
import org.springframework.security.config.annotation.web.configurers.HeadersConfigurer;
import org.springframework.security.config.http.SessionCreationPolicy;
import org.springframework.security.web.SecurityFilterChain;
import org.springframework.security.web.access.intercept.AuthorizationFilter;
import org.springframework.security.web.authentication.AuthenticationSuccessHandler;
import org.springframework.security.web.authentication.SavedRequestAwareAuthenticationSuccessHandler;
import org.springframework.security.web.authentication.UsernamePasswordAuthenticationFilter;
import org.springframework.security.web.csrf.CsrfException;
import org.springframework.security.web.csrf.CsrfFilter;
import org.springframework.security.web.header.writers.ReferrerPolicyHeaderWriter.ReferrerPolicy;
import turnsheet.access.Accounts;
import turnsheet.access.ApiKeys;
import turnsheet.access.Role;
import turnsheet.access.SignInLimiter;
import turnsheet.web.ErrorView;
import turnsheet.web.Problems;

/** Who may open what: programs by key, people by session. */
@Configuration(proxyBeanMethods = false)
class SecurityConfig {

  private static final String API_DOCUMENT = "/api/v1/openapi";

  private static final String CONTENT_POLICY =
      "default-src 'self'; img-src 'self' data:; style-src 'self'; script-src 'self';"
          + " frame-ancestors 'none'; form-action 'self'; base-uri 'none'";

  private static final String[] OPEN_TO_ALL = {
    SignInController.PATH,
    FirstRunController.NOT_SET_UP,
    "/first-run/**",
    "/enter/**",
    "/s/**",
    "/check",
    "/css/**",
    "/js/**",
    "/img/**",
    "/webjars/**",
    "/favicon.ico",
    "/actuator/health",
    "/actuator/health/**",
    "/error"
  };

  /** The description of the API: for programs and for people who are signed in. */
  @Bean
  @Order(1)
  SecurityFilterChain apiDocumentRules(HttpSecurity http, ApiKeys keys, Problems problems) {
    return api(http.securityMatcher(API_DOCUMENT, API_DOCUMENT + "/**", API_DOCUMENT + ".yaml"))
        .sessionManagement(s -> s.sessionCreationPolicy(SessionCreationPolicy.NEVER))
        .addFilterBefore(new ApiKeyFilter(keys), AuthorizationFilter.class)
        .exceptionHandling(e -> refuse(e, problems))
        .build();
  }

  @Bean
  @Order(2)
  SecurityFilterChain apiRules(HttpSecurity http, ApiKeys keys, Problems problems) {
    return api(http.securityMatcher("/api/**"))
        .sessionManagement(s -> s.sessionCreationPolicy(SessionCreationPolicy.STATELESS))
        .addFilterBefore(new ApiKeyFilter(keys), AuthorizationFilter.class)
        .exceptionHandling(e -> refuse(e, problems))
        .build();
  }

  @Bean
  @Order(3)
  SecurityFilterChain pageRules(HttpSecurity http, Accounts accounts, SignInLimiter limiter) {
    return http.authorizeHttpRequests(
            a ->
                a.dispatcherTypeMatchers(DispatcherType.FORWARD, DispatcherType.ERROR)
                    .permitAll()
                    .requestMatchers(OPEN_TO_ALL)
                    .permitAll()
                    .requestMatchers(
                        "/shop/people/**",
                        "/shop/profile",
                        "/shop/rules",
                        "/shop/logo/**",
                        "/shop/preferences",
                        "/import")
                    .hasRole(Role.OWNER.name())
                    .anyRequest()
                    .authenticated())
        .headers(SecurityConfig::headers)
        .formLogin(
            f ->
                f.loginPage(SignInController.PATH)
                    .usernameParameter(SignInController.NAME)
                    .successHandler(welcome(limiter))
                    .failureHandler((request, response, e) -> turnAway(request, response, limiter)))
        .logout(l -> l.logoutUrl("/sign-out").logoutSuccessUrl(SignInController.PATH + "?out"))
        .exceptionHandling(
            e ->
                e.authenticationEntryPoint(
                        (request, response, x) -> toSignIn(request, response, accounts))
                    .accessDeniedHandler(
                        (request, response, x) -> {
                          if (x instanceof CsrfException) {
                            request.setAttribute(ErrorView.STALE_FORM, true);
                          }
                          response.sendError(HttpStatus.FORBIDDEN.value());
                        }))
        .addFilterBefore(new StandingFilter(accounts), CsrfFilter.class)
        .addFilterBefore(new LimiterFilter(limiter), UsernamePasswordAuthenticationFilter.class)
        .build();
  }

  private static HttpSecurity api(HttpSecurity http) {
    return http.authorizeHttpRequests(a -> a.anyRequest().authenticated())
        .headers(SecurityConfig::headers)
        .csrf(c -> c.disable())
        .requestCache(c -> c.disable())
        .logout(c -> c.disable());
  }

  private static void headers(HeadersConfigurer<HttpSecurity> headers) {
    headers
        .contentSecurityPolicy(c -> c.policyDirectives(CONTENT_POLICY))
        .referrerPolicy(r -> r.policy(ReferrerPolicy.SAME_ORIGIN))
        .frameOptions(f -> f.deny());
  }

  private static void refuse(
      ExceptionHandlingConfigurer<HttpSecurity> handling, Problems problems) {
    handling
        .authenticationEntryPoint(
            (request, response, e) -> {
              response.setHeader(HttpHeaders.WWW_AUTHENTICATE, "Bearer");
              problems.write(
                  response,
                  HttpStatus.UNAUTHORIZED,
                  "keyNeeded",
                  "Send a working API key in the header: Authorization: Bearer tsk_...");
            })
        .accessDeniedHandler(
            (request, response, e) ->
                problems.write(
                    response,
                    HttpStatus.FORBIDDEN,
                    "notAllowed",
                    "The account of this key may not do this."));
  }

  private static AuthenticationSuccessHandler welcome(SignInLimiter limiter) {
    SavedRequestAwareAuthenticationSuccessHandler onward =
        new SavedRequestAwareAuthenticationSuccessHandler();
    return (request, response, visitor) -> {
      limiter.succeeded(LimiterFilter.name(request), request.getRemoteAddr());
      onward.onAuthenticationSuccess(request, response, visitor);
    };
  }

  private static void turnAway(
      HttpServletRequest request, HttpServletResponse response, SignInLimiter limiter)
      throws IOException {
    limiter.failed(LimiterFilter.name(request), request.getRemoteAddr());
    response.sendRedirect(request.getContextPath() + SignInController.PATH + "?wrong");
  }

  private static void toSignIn(
      HttpServletRequest request, HttpServletResponse response, Accounts accounts)
      throws IOException {
    String page = accounts.none() ? FirstRunController.NOT_SET_UP : SignInController.PATH;
    response.sendRedirect(request.getContextPath() + page);
  }
}
