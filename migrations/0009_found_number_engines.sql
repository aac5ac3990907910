update found_number n set kind = p.kind, engine_key = p.engine_key from part p where p.shop_id = n.shop_id and p.id = n.part_id;
