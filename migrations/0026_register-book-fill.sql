-- The book says what each donor was taken for.
update release r set serial = d.serial, engine = trim(d.maker || ' ' || d.model)
from donor d where d.shop_id = r.shop_id and d.id = r.donor_id;
