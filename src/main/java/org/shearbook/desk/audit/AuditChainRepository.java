package org.shearbook.desk.audit;

import jakarta.persistence.LockModeType;
import java.util.Optional;
import org.springframework.data.jpa.repository.Lock;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface AuditChainRepository extends Repository<AuditChainEntity, String> {

    @Lock(LockModeType.PESSIMISTIC_WRITE)
    @Query("select c from AuditChainEntity c where c.chainName = :name")
    AuditChainEntity lock(String name);

    Optional<AuditChainEntity> findById(String name);
}
