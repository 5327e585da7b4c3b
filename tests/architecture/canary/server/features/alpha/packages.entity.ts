// breaks: no-http-in-sql
import 'express'
