import express from "express";

/** The yardstick: an Express route that parses a JSON body and sends it back. */
const app = express();
app.post("/", express.json(), (req, res) => {
  res.json(req.body);
});
const server = app.listen(0, "127.0.0.1", () => {
  const address = server.address();
  if (address !== null && typeof address === "object") console.log(`http://127.0.0.1:${address.port}`);
});
