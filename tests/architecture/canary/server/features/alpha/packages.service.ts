// breaks: sql-has-its-files
import 'express'
// breaks: sql-has-its-files
import 'typeorm'
// breaks: sql-has-its-files
import 'pg'
