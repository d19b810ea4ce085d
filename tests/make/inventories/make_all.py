"""Makes every inventory below tests/fixtures/inventories anew; see the README there for what it needs."""

import chinese_list
import colleague
import dutch_stock
import flat_list
import french_list
import german_erp
import japanese_list
import lab_sheet
import merged_headers
import old_data
import same_table
import spanish_and_italian

for script in [chinese_list, colleague, dutch_stock, flat_list, french_list, german_erp, japanese_list, lab_sheet, merged_headers,
               old_data, same_table, spanish_and_italian]:
    script.make()
