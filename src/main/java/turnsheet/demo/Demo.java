package turnsheet.demo;

import org.springframework.context.annotation.ComponentScan;
import org.springframework.context.annotation.Configuration;

/** The invented shop: a second source of beans, given to the start of the demo alone. */
@Configuration(proxyBeanMethods = false)
@ComponentScan
public class Demo {}
