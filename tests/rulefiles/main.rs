//! Rule files: the built-in ones against the published criteria, and what a faulty one is answered.

mod cautions;
mod faults;
mod limits;
mod loading;
mod relations;
