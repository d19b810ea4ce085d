// Writes one sheet with the npm package `xlsx` (found through NODE_PATH): a JSON list of rows of its cells comes in.
const XLSX = require("xlsx");
const [path, name] = process.argv.slice(2);
const cells = JSON.parse(require("fs").readFileSync(0, "utf8"));
const sheet = {};
cells.forEach((row, r) => row.forEach((cell, c) => { if (cell) sheet[XLSX.utils.encode_cell({ r, c })] = cell; }));
sheet["!ref"] = XLSX.utils.encode_range({ s: { r: 0, c: 0 }, e: { r: cells.length - 1, c: cells[0].length - 1 } });
const book = { SheetNames: [name], Sheets: { [name]: sheet }, Props: { CreatedDate: new Date("2025-04-01T08:00:00Z") } };
XLSX.writeFile(book, path, { bookType: path.endsWith(".xls") ? "biff8" : "xlsb", bookSST: true });
