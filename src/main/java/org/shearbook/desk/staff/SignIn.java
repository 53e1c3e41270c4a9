package org.shearbook.desk.staff;

import org.shearbook.desk.audit.AsKnownAt;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.security.core.userdetails.User;
import org.springframework.security.core.userdetails.UserDetailsService;
import org.springframework.security.core.userdetails.UsernameNotFoundException;
import org.springframework.security.crypto.factory.PasswordEncoderFactories;
import org.springframework.security.crypto.password.PasswordEncoder;

/** Where sign-in finds people and how their passwords are kept. */
@Configuration(proxyBeanMethods = false)
class SignIn {

    @Bean
    PasswordEncoder passwordEncoder() {
        return PasswordEncoderFactories.createDelegatingPasswordEncoder();
    }

    @Bean
    UserDetailsService userDetailsService(PersonBook people) {
        return username -> {
            Person person = people.find(username, AsKnownAt.now())
                    .orElseThrow(() -> new UsernameNotFoundException("No such person"));
            return User.withUsername(person.username())
                    .password(people.passwordHash(username).orElseThrow())
                    .roles(person.roles().stream().map(Role::name).toArray(String[]::new))
                    .disabled(!person.enabled())
                    .build();
        };
    }
}
