//! Round trips and refusals of the written workbook.
