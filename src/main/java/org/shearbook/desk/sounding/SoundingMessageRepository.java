package org.shearbook.desk.sounding;

import java.util.List;
import org.springframework.data.jpa.repository.Query;
import org.springframework.data.repository.Repository;

interface SoundingMessageRepository extends Repository<SoundingMessageEntity, Long> {

    SoundingMessageEntity save(SoundingMessageEntity message);

    @Query("select m from SoundingMessageEntity m where m.soundingId = :id order by m.messageNumber")
    List<SoundingMessageEntity> ofSounding(long id);
}
