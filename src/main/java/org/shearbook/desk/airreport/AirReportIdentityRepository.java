package org.shearbook.desk.airreport;

import java.util.Optional;
import org.springframework.data.repository.Repository;

interface AirReportIdentityRepository extends Repository<AirReportIdentityEntity, Long> {

    Optional<AirReportIdentityEntity> findByReportIdAndVersion(long reportId, int version);
}
