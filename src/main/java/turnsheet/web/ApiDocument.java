package turnsheet.web;

import io.swagger.v3.oas.models.Components;
import io.swagger.v3.oas.models.OpenAPI;
import io.swagger.v3.oas.models.info.Info;
import io.swagger.v3.oas.models.info.License;
import io.swagger.v3.oas.models.media.Content;
import io.swagger.v3.oas.models.media.IntegerSchema;
import io.swagger.v3.oas.models.media.MediaType;
import io.swagger.v3.oas.models.media.ObjectSchema;
import io.swagger.v3.oas.models.media.Schema;
import io.swagger.v3.oas.models.media.StringSchema;
import io.swagger.v3.oas.models.responses.ApiResponse;
import io.swagger.v3.oas.models.security.SecurityRequirement;
import io.swagger.v3.oas.models.security.SecurityScheme;
import org.springdoc.core.customizers.OpenApiCustomizer;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

/** The head of the API's own description, and the problem answer that every operation may give. */
@Configuration(proxyBeanMethods = false)
class ApiDocument {

  private static final String KEY = "key";

  @Bean
  OpenAPI openApi() {
    return new OpenAPI()
        .info(
            new Info()
                .title("Turnsheet")
                .version("1")
                .description(
                    "Captures in, readings out. Make a key on the shop page and send it as a"
                        + " bearer token. Errors are problem details (RFC 9457) with a stable"
                        + " code.")
                .license(new License().name("Apache-2.0")))
        .addSecurityItem(new SecurityRequirement().addList(KEY))
        .components(
            new Components()
                .addSecuritySchemes(
                    KEY,
                    new SecurityScheme()
                        .type(SecurityScheme.Type.HTTP)
                        .scheme("bearer")
                        .description("A key of the shop page, tsk_...")));
  }

  @Bean
  OpenApiCustomizer problemAnswers() {
    return api -> {
      api.getComponents().addSchemas("Problem", problem());
      if (api.getPaths() != null) {
        api.getPaths().values().stream()
            .flatMap(path -> path.readOperations().stream())
            .forEach(operation -> operation.getResponses().addApiResponse("default", answer()));
      }
    };
  }

  private static ApiResponse answer() {
    Schema<?> reference = new Schema<>().$ref("#/components/schemas/Problem");
    return new ApiResponse()
        .description("What went wrong")
        .content(
            new Content()
                .addMediaType("application/problem+json", new MediaType().schema(reference)));
  }

  private static Schema<?> problem() {
    return new ObjectSchema()
        .description("Problem details, RFC 9457")
        .addProperty("title", new StringSchema())
        .addProperty("status", new IntegerSchema())
        .addProperty("detail", new StringSchema().description("a sentence for people"))
        .addProperty("code", new StringSchema().description("a stable word for programs"));
  }
}
