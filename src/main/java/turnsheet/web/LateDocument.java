package turnsheet.web;

import org.jspecify.annotations.Nullable;
import org.springframework.beans.factory.config.BeanDefinition;
import org.springframework.beans.factory.config.BeanFactoryPostProcessor;
import org.springframework.beans.factory.config.ConfigurableListableBeanFactory;
import org.springframework.stereotype.Component;

/**
 * Keeps the makers of the API's description asleep until someone asks for it: waking them with the
 * service costs about a quarter of its start.
 */
@Component
class LateDocument implements BeanFactoryPostProcessor {

  private static final String MAKERS = "org.springdoc.";

  @Override
  public void postProcessBeanFactory(ConfigurableListableBeanFactory beans) {
    for (String name : beans.getBeanDefinitionNames()) {
      BeanDefinition definition = beans.getBeanDefinition(name);
      if (isMaker(definition.getBeanClassName()) || isMaker(definition.getFactoryBeanName())) {
        definition.setLazyInit(true);
      }
    }
  }

  private static boolean isMaker(@Nullable String name) {
    return name != null && name.startsWith(MAKERS);
  }
}
