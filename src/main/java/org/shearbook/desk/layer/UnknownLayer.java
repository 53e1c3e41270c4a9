package org.shearbook.desk.layer;

/** There is no such layer, or there was none yet at the moment asked for. */
public class UnknownLayer extends RuntimeException {

    public UnknownLayer(LayerId id) {
        super("There is no layer %s at that moment. Look it up in the list of layers.".formatted(id));
    }
}
